import { Qualification, QualificationCreate } from "@beadroll/domain/schemas/person";
import type { ReactElement } from "react";
import { DateField } from "../../kit/fields/date-field.tsx";
import { SelectField } from "../../kit/fields/select-field.tsx";
import { TextField } from "../../kit/fields/text-field.tsx";
import { Form } from "../../kit/forms/form.tsx";
import { useForm } from "../../kit/forms/use-form.ts";
import { toast } from "../../kit/states/announcements.ts";
import { useAddQualification } from "./people.mutations.ts";

const STANDARDS = Qualification.shape.standard.options;
const STANDARD_WORDS = {
  "ISO 14732": "ISO 14732, operators and weld setters",
  "ISO 9606-1": "ISO 9606-1, welders",
} as const;

/** Records a qualification. */
export function QualificationForm(props: { tag: string }): ReactElement {
  const add = useAddQualification(props.tag);
  const form = useForm({
    schema: QualificationCreate,
    start: { standard: "ISO 14732", process: "135" },
    draft: `qualification ${props.tag}`,
    onSubmit: async (fields) => {
      await add.mutateAsync(fields);
      toast(`Qualification ${fields.number} recorded`, "good");
      form.startAnew();
    },
  });
  return (
    <Form form={form} action="Record the qualification">
      <SelectField
        {...form.choice("standard", STANDARDS)}
        label="Given under"
        options={STANDARDS.map((value) => ({ value, label: STANDARD_WORDS[value] }))}
      />
      <TextField {...form.text("number")} label="Certificate number" code />
      <TextField {...form.text("process")} label="Process, ISO 4063" code />
      <TextField {...form.text("range")} label="Range" />
      <DateField {...form.text("issued_on")} label="Issued on" />
      <DateField {...form.text("valid_until")} label="Valid until" />
    </Form>
  );
}
