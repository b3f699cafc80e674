import {
  INSPECTION_METHODS,
  INSPECTION_RESULTS,
  InspectionCreate,
} from "@beadroll/domain/schemas/inspection";
import type { SeamPage } from "@beadroll/domain/schemas/seam";
import { type ReactElement, useState } from "react";
import { Button } from "../../kit/actions/button.tsx";
import { ConfirmDialog } from "../../kit/actions/confirm-dialog.tsx";
import { ChoiceField } from "../../kit/fields/choice-field.tsx";
import { SelectField } from "../../kit/fields/select-field.tsx";
import { TextField } from "../../kit/fields/text-field.tsx";
import { Form } from "../../kit/forms/form.tsx";
import { useForm } from "../../kit/forms/use-form.ts";
import { toast } from "../../kit/states/announcements.ts";
import { problemFrom } from "../../kit/states/problem-words.ts";
import { METHOD_WORDS } from "./inspections-list.tsx";
import { seamNumber } from "./seam-words.ts";
import { useRecordInspection } from "./seams.mutations.ts";

const RESULT_WORDS = { accepted: "Accepted", rejected: "Rejected" } as const;

/** Records an inspection of a seam, after asking. */
export function InspectionForm(props: { seam: SeamPage }): ReactElement {
  const { seam } = props;
  const [asked, setAsked] = useState<InspectionCreate | null>(null);
  const [error, setError] = useState<string | null>(null);
  const record = useRecordInspection(seam.tag);
  const form = useForm({
    schema: InspectionCreate,
    start: { method: "VT", result: "accepted", note: "" },
    draft: `inspection ${seam.tag}`,
    onSubmit: async (inspection) => {
      setError(null);
      setAsked(inspection);
    },
  });
  const confirm = () => {
    if (asked === null) return;
    record.mutate(asked, {
      onSuccess: () => {
        setAsked(null);
        toast(
          `Seam ${seam.number}: ${asked.result} by ${asked.method}`,
          asked.result === "accepted" ? "good" : "stop",
        );
      },
      onError: (cause) => setError(problemFrom(cause).detail),
    });
  };
  const name = seamNumber(seam.number, seam.attempt);
  return (
    <>
      <Form
        form={form}
        action="Record the inspection"
        aside={<Button onClick={() => form.startAnew()}>Clear</Button>}
      >
        <SelectField
          {...form.choice("method", INSPECTION_METHODS)}
          label="Method"
          options={INSPECTION_METHODS.map((method) => ({
            value: method,
            label: `${METHOD_WORDS[method]} (${method})`,
          }))}
        />
        <ChoiceField
          {...form.choice("result", INSPECTION_RESULTS)}
          label={`Against quality level ${seam.quality_level}, ISO 5817`}
          options={INSPECTION_RESULTS.map((result) => ({ value: result, label: RESULT_WORDS[result] }))}
        />
        <TextField {...form.text("note")} label="What was seen" lines={3} />
      </Form>
      <ConfirmDialog
        open={asked !== null}
        onClose={() => setAsked(null)}
        title={asked?.result === "rejected" ? `Reject seam ${name}?` : `Accept seam ${name}?`}
        action={asked?.result === "rejected" ? "Reject the seam" : "Accept the seam"}
        kind={asked?.result === "rejected" ? "danger" : "primary"}
        busy={record.isPending}
        {...(error !== null && { error })}
        onConfirm={confirm}
      >
        <p>
          1 inspection of 1 seam is recorded under your name and appended to the ledger. It cannot be taken
          back, only followed by another.
        </p>
        {asked?.result === "rejected" ? <p>The next scan or pass of this seam begins its repair.</p> : null}
      </ConfirmDialog>
    </>
  );
}
