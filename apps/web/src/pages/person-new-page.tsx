import { PersonCreate } from "@beadroll/domain/schemas/person";
import type { ReactElement } from "react";
import { useNavigate } from "react-router";
import { PATHS, pathTo } from "../app/paths.ts";
import { useCreatePerson } from "../features/people/people.mutations.ts";
import { ButtonLink } from "../kit/actions/button.tsx";
import { TextField } from "../kit/fields/text-field.tsx";
import { Form } from "../kit/forms/form.tsx";
import { useForm } from "../kit/forms/use-form.ts";
import { Breadcrumbs } from "../kit/page/breadcrumbs.tsx";
import { PageHead } from "../kit/page/page-head.tsx";
import { Sheet } from "../kit/page/sheet.tsx";
import { toast } from "../kit/states/announcements.ts";

/** A person is recorded; the badge's tag is minted. */
export default function PersonNewPage(): ReactElement {
  const navigate = useNavigate();
  const create = useCreatePerson();
  const form = useForm({
    schema: PersonCreate,
    draft: "person-new",
    onSubmit: async (fields) => {
      const person = await create.mutateAsync(fields);
      toast(`${person.name} recorded, badge ${person.tag}`, "good");
      await navigate(pathTo("person", { tag: person.tag }));
    },
  });
  return (
    <>
      <PageHead
        title="Record a person"
        above={<Breadcrumbs trail={[{ to: PATHS.people.path, label: "People" }]} />}
      />
      <div className="max-w-xl">
        <Sheet>
          <Form
            form={form}
            action="Record the person"
            aside={<ButtonLink to={PATHS.people.path}>Cancel</ButtonLink>}
          >
            <TextField {...form.text("name")} label="Name" />
            <TextField {...form.text("job")} label="Job" />
          </Form>
        </Sheet>
      </div>
    </>
  );
}
