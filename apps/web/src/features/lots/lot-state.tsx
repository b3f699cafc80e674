import type { Lot, LotPage } from "@beadroll/domain/schemas/lot";
import { type ReactElement, useState } from "react";
import { Button } from "../../kit/actions/button.tsx";
import { ConfirmDialog } from "../../kit/actions/confirm-dialog.tsx";
import { toast } from "../../kit/states/announcements.ts";
import { problemFrom } from "../../kit/states/problem-words.ts";
import { STATE_LOOKS } from "../../kit/states/state-words.ts";
import { nextStates, reachWords } from "./lot-words.ts";
import { usePatchLot } from "./lots.mutations.ts";

/** What a state means for the shop floor. */
const MEANS: Readonly<Record<Lot["state"], string>> = {
  received: "It can neither be built in nor mounted.",
  released: "It can be built in and mounted from now on.",
  quarantined: "It can no longer be built in or mounted. What was made of it is not held by this.",
  used_up: "It can no longer be built in or mounted.",
};

/** Changes a lot's state, after saying in numbers what it touches. */
export function LotStateButtons(props: { lot: LotPage }): ReactElement {
  const { lot } = props;
  const [asked, setAsked] = useState<Lot["state"] | null>(null);
  const [error, setError] = useState<string | null>(null);
  const patch = usePatchLot(lot);
  const steps = nextStates(lot.state);
  const deed = steps.find((step) => step.state === asked)?.deed ?? "";
  const confirm = () => {
    if (asked === null) return;
    patch.mutate(
      { state: asked },
      {
        onSuccess: () => {
          setAsked(null);
          toast(
            `Lot ${lot.number}: ${STATE_LOOKS[asked].word.toLowerCase()}`,
            asked === "quarantined" ? "stop" : "good",
          );
        },
        onError: (cause) => setError(problemFrom(cause).detail),
      },
    );
  };
  return (
    <>
      {steps.map((step) => (
        <Button
          key={step.state}
          kind={step.state === "quarantined" ? "danger" : "secondary"}
          onClick={() => {
            setError(null);
            setAsked(step.state);
          }}
        >
          {step.deed}
        </Button>
      ))}
      <ConfirmDialog
        open={asked !== null}
        onClose={() => setAsked(null)}
        title={`${deed} lot ${lot.number}?`}
        action={deed}
        kind={asked === "quarantined" ? "danger" : "primary"}
        busy={patch.isPending}
        {...(error !== null && { error })}
        onConfirm={confirm}
      >
        <p>{reachWords(lot)}</p>
        <p>{asked === null ? "" : MEANS[asked]}</p>
      </ConfirmDialog>
    </>
  );
}
