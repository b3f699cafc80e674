import { PartCreate } from "@beadroll/domain/schemas/part";
import { useSuspenseInfiniteQuery } from "@tanstack/react-query";
import type { ReactElement } from "react";
import { useNavigate } from "react-router";
import { PATHS, pathTo } from "../app/paths.ts";
import { queryClient } from "../app/providers.tsx";
import { drawingQueries } from "../features/drawings/drawings.queries.ts";
import { useCreatePart } from "../features/parts/parts.mutations.ts";
import { ButtonLink } from "../kit/actions/button.tsx";
import { SelectField } from "../kit/fields/select-field.tsx";
import { TextField } from "../kit/fields/text-field.tsx";
import { Form } from "../kit/forms/form.tsx";
import { useForm } from "../kit/forms/use-form.ts";
import { Breadcrumbs } from "../kit/page/breadcrumbs.tsx";
import { PageHead } from "../kit/page/page-head.tsx";
import { Sheet } from "../kit/page/sheet.tsx";
import { toast } from "../kit/states/announcements.ts";
import { EmptyState } from "../kit/states/empty-state.tsx";

/** Fetches the drawings a part can be made to. */
export async function loader(): Promise<null> {
  await queryClient.ensureInfiniteQueryData(drawingQueries.list({}));
  return null;
}

/** A part is started from a drawing. */
export default function PartNewPage(): ReactElement {
  const navigate = useNavigate();
  const create = useCreatePart();
  const { data } = useSuspenseInfiniteQuery(drawingQueries.list({}));
  const drawings = data.pages.flatMap((page) => page.items);
  const form = useForm({
    schema: PartCreate,
    start: {},
    draft: "part-new",
    onSubmit: async (fields) => {
      const part = await create.mutateAsync(fields);
      toast(`${part.name} started as ${part.tag}`, "good");
      await navigate(pathTo("part", { tag: part.tag }));
    },
  });
  return (
    <>
      <PageHead
        title="Start a part"
        above={<Breadcrumbs trail={[{ to: PATHS.parts.path, label: "Parts" }]} />}
      />
      {drawings.length === 0 ? (
        <EmptyState
          title="There is no drawing yet"
          action={<ButtonLink to={PATHS.drawings.path}>To the drawings</ButtonLink>}
        >
          A part's seams are planned from its drawing's model seams. Record the drawing first.
        </EmptyState>
      ) : (
        <div className="max-w-2xl">
          <Sheet>
            <Form
              form={form}
              action="Start the part"
              aside={<ButtonLink to={PATHS.parts.path}>Cancel</ButtonLink>}
            >
              <SelectField
                {...form.choice(
                  "drawing_id",
                  drawings.map((drawing) => drawing.id),
                )}
                label="Drawing"
                options={drawings.map((drawing) => ({
                  value: drawing.id,
                  label: `${drawing.number} rev ${drawing.revision}, ${drawing.title}`,
                }))}
              />
              <TextField {...form.text("serial")} label="Serial number" code />
              <TextField {...form.text("order_no")} label="Order" code />
              <TextField {...form.text("parent_tag")} label="Tag of the part it is built into" code />
            </Form>
          </Sheet>
        </div>
      )}
    </>
  );
}
