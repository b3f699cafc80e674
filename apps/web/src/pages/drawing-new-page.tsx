import { Drawing, DrawingCreate } from "@beadroll/domain/schemas/drawing";
import type { ReactElement } from "react";
import { useNavigate } from "react-router";
import { PATHS, pathTo } from "../app/paths.ts";
import { DRAWING_LOOKS } from "../features/drawings/drawing-words.ts";
import { useCreateDrawing } from "../features/drawings/drawings.mutations.ts";
import { ButtonLink } from "../kit/actions/button.tsx";
import { ChoiceField } from "../kit/fields/choice-field.tsx";
import { TextField } from "../kit/fields/text-field.tsx";
import { Form } from "../kit/forms/form.tsx";
import { useForm } from "../kit/forms/use-form.ts";
import { Breadcrumbs } from "../kit/page/breadcrumbs.tsx";
import { PageHead } from "../kit/page/page-head.tsx";
import { Sheet } from "../kit/page/sheet.tsx";
import { toast } from "../kit/states/announcements.ts";

const STATUSES = Drawing.shape.status.options;

/** A drawing or a new revision is recorded. */
export default function DrawingNewPage(): ReactElement {
  const navigate = useNavigate();
  const create = useCreateDrawing();
  const form = useForm({
    schema: DrawingCreate,
    start: { status: "draft" },
    draft: "drawing-new",
    onSubmit: async (fields) => {
      const drawing = await create.mutateAsync(fields);
      toast(`${drawing.number} rev ${drawing.revision} recorded`, "good");
      await navigate(pathTo("drawing", { id: drawing.id }));
    },
  });
  return (
    <>
      <PageHead
        title="Record a drawing"
        above={<Breadcrumbs trail={[{ to: PATHS.drawings.path, label: "Drawings" }]} />}
      />
      <div className="max-w-xl">
        <Sheet>
          <Form
            form={form}
            action="Record the drawing"
            aside={<ButtonLink to={PATHS.drawings.path}>Cancel</ButtonLink>}
          >
            <TextField {...form.text("number")} label="Number" code />
            <TextField {...form.text("revision")} label="Revision" code />
            <TextField {...form.text("title")} label="Title" />
            <ChoiceField
              {...form.choice("status", STATUSES)}
              label="Status"
              options={STATUSES.map((value) => ({ value, label: DRAWING_LOOKS[value].word }))}
            />
          </Form>
        </Sheet>
      </div>
    </>
  );
}
