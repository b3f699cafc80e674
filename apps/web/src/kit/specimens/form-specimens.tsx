import { LOT_KINDS, LotCreate } from "@beadroll/domain/schemas/lot";
import { type ReactElement, useState } from "react";
import { Button, ButtonRow } from "../actions/button.tsx";
import { ConfirmDialog } from "../actions/confirm-dialog.tsx";
import { CheckField } from "../fields/check-field.tsx";
import { ChoiceField } from "../fields/choice-field.tsx";
import { DateField } from "../fields/date-field.tsx";
import { FileDrop } from "../fields/file-drop.tsx";
import { NumberField } from "../fields/number-field.tsx";
import { PasswordField } from "../fields/password-field.tsx";
import { SelectField } from "../fields/select-field.tsx";
import { TextField } from "../fields/text-field.tsx";
import { Form } from "../forms/form.tsx";
import { useForm } from "../forms/use-form.ts";
import { Sheet } from "../page/sheet.tsx";
import { toast } from "../states/announcements.ts";

const LOT_WORDS: Record<(typeof LOT_KINDS)[number], string> = {
  plate: "Plate",
  section: "Section",
  tube: "Tube",
  wire: "Wire",
  gas: "Gas",
  flux: "Flux",
};
const UNITS = ["pcs", "kg", "m", "m3", "l"] as const;

/** A whole form whose rules come from a schema. */
export function LotFormSpecimen(): ReactElement {
  const form = useForm({
    schema: LotCreate,
    start: { kind: "plate", unit: "pcs", supplier: "Nordhall Steel" },
    draft: "kit-lot",
    onSubmit: async (lot) => toast(`${lot.kind} ${lot.number} would be recorded`, "good"),
  });
  return (
    <Sheet title="A lot comes in">
      <Form form={form} action="Record the lot" aside={<Button>Cancel</Button>}>
        <ChoiceField
          {...form.choice("kind", LOT_KINDS)}
          label="What it is"
          options={LOT_KINDS.map((kind) => ({ value: kind, label: LOT_WORDS[kind] }))}
        />
        <TextField {...form.text("number")} label="Heat number" code />
        <TextField {...form.text("supplier")} label="Supplier" />
        <TextField {...form.text("grade")} label="Grade" />
        <NumberField {...form.number("thickness_mm")} label="Thickness" />
        <NumberField {...form.number("quantity")} label="Amount" />
        <SelectField
          {...form.choice("unit", UNITS)}
          label="Counted in"
          options={UNITS.map((unit) => ({ value: unit, label: unit }))}
        />
        <DateField {...form.text("received_on")} label="Came in on" />
        <TextField {...form.text("note")} label="Remarks" lines={3} />
      </Form>
    </Sheet>
  );
}

/** Fields in their states, buttons, and the question before a deed. */
export function FieldSpecimens(): ReactElement {
  const [gap_mm, setGap] = useState<number | null>(3.2);
  const [password, setPassword] = useState("");
  const [files, setFiles] = useState<readonly File[]>([]);
  const [isChecked, setChecked] = useState(true);
  return (
    <>
      <Sheet title="Fields">
        <div className="grid gap-4">
          <NumberField
            label="Gap"
            name="gap_mm"
            unit="mm"
            value={gap_mm}
            onChange={setGap}
            limit="0 to 3 mm, from the model seam"
            error={(gap_mm ?? 0) > 3 ? "At most 3 mm. Held joints go to the coordinator." : undefined}
          />
          <TextField
            label="Drawing"
            name="drawing"
            value="FW-2210 rev C"
            onChange={() => undefined}
            disabled
          />
          <PasswordField label="Password" name="password" value={password} onChange={setPassword} />
          <FileDrop
            label="Scan of the seam"
            name="scan"
            files={files}
            onChange={setFiles}
            accept=".csv,.ply,.pcd,.xyz"
          />
          <CheckField
            label="Scan this seam on every part"
            name="always"
            value={isChecked}
            onChange={setChecked}
          />
        </div>
      </Sheet>
      <ButtonSpecimens />
      <TabletSpecimen />
    </>
  );
}

function ButtonSpecimens(): ReactElement {
  const [isAsking, setAsking] = useState(false);
  return (
    <Sheet title="Deeds">
      <ButtonRow>
        <Button kind="primary" onClick={() => toast("Seam S4 accepted", "good")}>
          Accept seam S4
        </Button>
        <Button
          onClick={() => toast("The scan was kept on this computer; the server did not answer.", "attend")}
        >
          Keep for later
        </Button>
        <Button kind="danger" onClick={() => setAsking(true)}>
          Hold 12 parts
        </Button>
        <Button kind="quiet">Show the ledger entry</Button>
        <Button busy>Sending</Button>
        <Button disabled>Release</Button>
      </ButtonRow>
      <ConfirmDialog
        open={isAsking}
        onClose={() => setAsking(false)}
        title="Hold 12 parts?"
        action="Hold 12 parts"
        kind="danger"
        signature
        onConfirm={() => setAsking(false)}
      >
        <p>
          Heat <span className="figures">H48812</span> went into 12 parts with 71 seams. 9 parts are here, 3
          were shipped to two customers.
        </p>
        <p>No cell will weld on them and none can be released until the hold is lifted with a reason.</p>
      </ConfirmDialog>
    </Sheet>
  );
}

/** What the tablet by the cell uses: the same parts, large. */
function TabletSpecimen(): ReactElement {
  const [gap, setGap] = useState<number | null>(null);
  const [side, setSide] = useState<"wire" | "gas" | "flux">("wire");
  return (
    <Sheet title="Large, for the tablet">
      <div className="grid gap-5">
        <ChoiceField
          large
          label="Slot"
          name="slot"
          value={side}
          onChange={setSide}
          options={[
            { value: "wire", label: "Wire" },
            { value: "gas", label: "Gas" },
            { value: "flux", label: "Flux" },
          ]}
        />
        <NumberField
          large
          label="Leg length"
          name="leg_mm"
          unit="mm"
          value={gap}
          onChange={setGap}
          limit="at least 7 mm"
        />
        <ButtonRow>
          <Button large kind="primary">
            Load this lot
          </Button>
          <Button large>Back</Button>
        </ButtonRow>
      </div>
    </Sheet>
  );
}
