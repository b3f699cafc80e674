import { LOT_KINDS, LotCreate } from "@beadroll/domain/schemas/lot";
import type { ReactElement } from "react";
import { useNavigate } from "react-router";
import { PATHS, pathTo } from "../app/paths.ts";
import { KIND_WORDS } from "../features/lots/lot-words.ts";
import { useCreateLot } from "../features/lots/lots.mutations.ts";
import { ButtonLink } from "../kit/actions/button.tsx";
import { ChoiceField } from "../kit/fields/choice-field.tsx";
import { DateField } from "../kit/fields/date-field.tsx";
import { NumberField } from "../kit/fields/number-field.tsx";
import { SelectField } from "../kit/fields/select-field.tsx";
import { TextField } from "../kit/fields/text-field.tsx";
import { Form } from "../kit/forms/form.tsx";
import { useForm } from "../kit/forms/use-form.ts";
import { Breadcrumbs } from "../kit/page/breadcrumbs.tsx";
import { PageHead } from "../kit/page/page-head.tsx";
import { Sheet } from "../kit/page/sheet.tsx";
import { toast } from "../kit/states/announcements.ts";

const UNITS = ["pcs", "kg", "m", "m3", "l"] as const;
const UNIT_WORDS = { pcs: "pieces", kg: "kg", m: "m", m3: "m³", l: "litres" } as const;

/** A lot comes in. */
export default function LotNewPage(): ReactElement {
  const navigate = useNavigate();
  const create = useCreateLot();
  const form = useForm({
    schema: LotCreate,
    start: { kind: "plate", unit: "pcs", received_on: new Date().toISOString().slice(0, 10) },
    draft: "lot-new",
    onSubmit: async (fields) => {
      const lot = await create.mutateAsync(fields);
      toast(`Lot ${lot.number} received as ${lot.tag}`, "good");
      await navigate(pathTo("lot", { tag: lot.tag }));
    },
  });
  return (
    <>
      <PageHead
        title="Receive a lot"
        above={<Breadcrumbs trail={[{ to: PATHS.lots.path, label: "Lots" }]} />}
      />
      <div className="max-w-2xl">
        <Sheet>
          <Form
            form={form}
            action="Receive the lot"
            aside={<ButtonLink to={PATHS.lots.path}>Cancel</ButtonLink>}
          >
            <ChoiceField
              {...form.choice("kind", LOT_KINDS)}
              label="What it is"
              options={LOT_KINDS.map((value) => ({ value, label: KIND_WORDS[value] }))}
            />
            <TextField {...form.text("number")} label="Heat or lot number" code />
            <TextField {...form.text("supplier")} label="Supplier" />
            <TextField {...form.text("grade")} label="Grade or designation" />
            <TextField {...form.text("dimension")} label="Size as delivered" />
            <NumberField {...form.number("thickness_mm")} label="Thickness" />
            <NumberField {...form.number("quantity")} label="Amount" />
            <SelectField
              {...form.choice("unit", UNITS)}
              label="Counted in"
              options={UNITS.map((value) => ({ value, label: UNIT_WORDS[value] }))}
            />
            <DateField {...form.text("received_on")} label="Came in on" />
            <TextField {...form.text("note")} label="Remarks" lines={3} />
          </Form>
        </Sheet>
      </div>
    </>
  );
}
