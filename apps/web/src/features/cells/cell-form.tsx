import { CellCreate } from "@beadroll/domain/schemas/cell";
import { type ReactElement, useEffect, useRef } from "react";
import { Button } from "../../kit/actions/button.tsx";
import { NumberField } from "../../kit/fields/number-field.tsx";
import { TextField } from "../../kit/fields/text-field.tsx";
import { Form } from "../../kit/forms/form.tsx";
import { useForm } from "../../kit/forms/use-form.ts";
import { toast } from "../../kit/states/announcements.ts";
import { useCreateCell } from "./cells.mutations.ts";

/** Records a cell: robot, power source and scanner, by name. */
export function CellForm(props: { onDone: () => void }): ReactElement {
  const create = useCreateCell();
  const holder = useRef<HTMLDivElement>(null);
  // The button that opened the form is gone; whoever pressed it goes on in the first field.
  useEffect(() => holder.current?.querySelector("input")?.focus(), []);
  const form = useForm({
    schema: CellCreate,
    draft: "cell-new",
    onSubmit: async (fields) => {
      const cell = await create.mutateAsync(fields);
      toast(`${cell.name} recorded as ${cell.tag}`, "good");
      props.onDone();
    },
  });
  return (
    <div ref={holder}>
      <Form form={form} action="Record the cell" aside={<Button onClick={props.onDone}>Cancel</Button>}>
        <TextField {...form.text("name")} label="Name on the floor" />
        <TextField {...form.text("robot")} label="Robot" />
        <TextField {...form.text("power_source")} label="Power source" />
        <TextField {...form.text("scanner")} label="Scanner" />
        <NumberField
          {...form.number("scanner_accuracy_mm")}
          label="Scanner's stated accuracy"
          limit="The bound from its data sheet; it goes into the uncertainty of every number."
        />
      </Form>
    </div>
  );
}
