import type { ModelSeam } from "@beadroll/domain/schemas/drawing";
import { SCAN_RULES } from "@beadroll/domain/schemas/drawing";
import type { ReactElement } from "react";
import { z } from "zod";
import { Button } from "../../kit/actions/button.tsx";
import { ChoiceField } from "../../kit/fields/choice-field.tsx";
import { NumberField } from "../../kit/fields/number-field.tsx";
import { Form } from "../../kit/forms/form.tsx";
import { useForm } from "../../kit/forms/use-form.ts";
import { toast } from "../../kit/states/announcements.ts";
import { SCAN_RULE_WORDS } from "./drawing-words.ts";
import { usePatchModelSeam } from "./drawings.mutations.ts";

const QUANTITIES = [
  ["lateral_mm", "Lateral", "mm"],
  ["normal_mm", "Normal", "mm"],
  ["gap_mm", "Gap, from nominal", "mm"],
  ["mismatch_mm", "Mismatch, from nominal", "mm"],
  ["angle_deg", "Angle, from nominal", "°"],
] as const;

const limit = z.number().positive();
const Fields = z
  .object({
    scan_rule: z.enum(SCAN_RULES),
    within_lateral_mm: limit,
    within_normal_mm: limit,
    within_gap_mm: limit,
    within_mismatch_mm: limit,
    within_angle_deg: limit,
    adapt_lateral_mm: limit,
    adapt_normal_mm: limit,
    adapt_gap_mm: limit,
    adapt_mismatch_mm: limit,
    adapt_angle_deg: limit,
  })
  .superRefine((fields, context) => {
    for (const [id, title] of QUANTITIES) {
      if (fields[`adapt_${id}`] < fields[`within_${id}`])
        context.addIssue({
          code: "custom",
          path: [`adapt_${id}`],
          message: `${title}: must not be below what is within`,
        });
    }
  });

const startOf = (seam: ModelSeam): Record<string, unknown> => {
  const { within, adapt } = seam.limits;
  const start: Record<string, unknown> = { scan_rule: seam.scan_rule };
  for (const [id] of QUANTITIES) {
    start[`within_${id}`] = within?.[id] ?? null;
    start[`adapt_${id}`] = adapt?.[id] ?? null;
  }
  return start;
};

/** Changes the limits of a model seam; scans already judged keep the limits they were judged by. */
export function LimitsForm(props: { seam: ModelSeam; onDone: () => void }): ReactElement {
  const { seam, onDone } = props;
  const patch = usePatchModelSeam(seam);
  const form = useForm({
    schema: Fields,
    start: startOf(seam),
    onSubmit: async (fields) => {
      const level = (name: "within" | "adapt") =>
        Object.fromEntries(QUANTITIES.map(([id]) => [id, fields[`${name}_${id}`]]));
      const limits = { ...seam.limits, within: level("within"), adapt: level("adapt") };
      await patch.mutateAsync({ scan_rule: fields.scan_rule, limits });
      toast(`Limits of seam ${seam.number} changed`, "good");
      onDone();
    },
  });
  return (
    <Form form={form} action="Change the limits" aside={<Button onClick={onDone}>Cancel</Button>}>
      <ChoiceField
        {...form.choice("scan_rule", SCAN_RULES)}
        label="The cell scans it"
        options={SCAN_RULES.map((value) => ({ value, label: SCAN_RULE_WORDS[value] }))}
      />
      {QUANTITIES.map(([id, title, unit]) => (
        <fieldset key={id} className="grid grid-cols-2 gap-4">
          <legend className="sr-only">{title}</legend>
          <NumberField {...form.number(`within_${id}`)} label={`${title}, within`} unit={unit} />
          <NumberField {...form.number(`adapt_${id}`)} label={`${title}, adapt`} unit={unit} />
        </fieldset>
      ))}
    </Form>
  );
}
