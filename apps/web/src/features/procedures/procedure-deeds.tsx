import { ApiProblem } from "@beadroll/client/api-problem";
import type { Procedure } from "@beadroll/domain/schemas/procedure";
import { type ReactElement, useState } from "react";
import { Button } from "../../kit/actions/button.tsx";
import { ConfirmDialog } from "../../kit/actions/confirm-dialog.tsx";
import { toast } from "../../kit/states/announcements.ts";
import { problemFrom } from "../../kit/states/problem-words.ts";
import { usePatchProcedure } from "./procedures.mutations.ts";

type Status = Procedure["status"];

const DEEDS: Readonly<Record<Status, readonly { readonly status: Status; readonly deed: string }[]>> = {
  draft: [{ status: "approved", deed: "Approve" }],
  approved: [{ status: "withdrawn", deed: "Withdraw" }],
  withdrawn: [{ status: "approved", deed: "Approve again" }],
};

const MEANS: Readonly<Record<Status, string>> = {
  draft: "Nothing is welded to it.",
  approved: "Passes of model seams that name it are held against its ranges.",
  withdrawn: "It stays on the record of what was welded to it.",
};

/** What somebody saw, and what stands there now. */
function refusalWords(cause: unknown, seen: Procedure): string {
  if (cause instanceof ApiProblem && cause.code === "version-stale")
    return `Somebody changed this procedure meanwhile. You saw version ${seen.version} (${seen.status}); the page behind now shows what stands. Look at it, then decide again.`;
  return problemFrom(cause).detail;
}

/** Approves or withdraws a procedure, after asking. */
export function ProcedureDeeds(props: { procedure: Procedure }): ReactElement {
  const { procedure } = props;
  const [asked, setAsked] = useState<{ status: Status; deed: string } | null>(null);
  const [error, setError] = useState<string | null>(null);
  const patch = usePatchProcedure(procedure);
  const name = `${procedure.number} rev ${procedure.revision}`;
  const confirm = () => {
    if (asked === null) return;
    patch.mutate(
      { status: asked.status },
      {
        onSuccess: () => {
          setAsked(null);
          toast(`${name}: ${asked.status}`, asked.status === "approved" ? "good" : "attend");
        },
        onError: (cause) => setError(refusalWords(cause, procedure)),
      },
    );
  };
  return (
    <>
      {DEEDS[procedure.status].map((step) => (
        <Button
          key={step.status}
          kind={step.status === "withdrawn" ? "danger" : "primary"}
          onClick={() => {
            setError(null);
            setAsked(step);
          }}
        >
          {step.deed}
        </Button>
      ))}
      <ConfirmDialog
        open={asked !== null}
        onClose={() => setAsked(null)}
        title={`${asked?.deed ?? ""} ${name}?`}
        action={asked?.deed ?? ""}
        kind={asked?.status === "withdrawn" ? "danger" : "primary"}
        busy={patch.isPending}
        {...(error !== null && { error })}
        onConfirm={confirm}
      >
        <p>
          1 procedure becomes {asked?.status}. {asked === null ? "" : MEANS[asked.status]}
        </p>
      </ConfirmDialog>
    </>
  );
}
