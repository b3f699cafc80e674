import { type FormEvent, type ReactElement, type ReactNode, useEffect, useRef } from "react";
import { Button } from "../actions/button.tsx";
import { FaultPanel } from "../states/fault-panel.tsx";
import { formatInstant } from "../units/instants.ts";
import type { FormState } from "./use-form.ts";

export interface FormProps {
  form: FormState;
  /** What sending does: "Record the lot". */
  action: string;
  children: ReactNode;
  /** Beside the main button: a way out. */
  aside?: ReactNode;
  large?: boolean;
}

/** Fields, what is wrong with them, and the one button that sends them. */
export function Form(props: FormProps): ReactElement {
  const { form } = props;
  const element = useRef<HTMLFormElement>(null);
  const wrong = Object.values(form.errors).filter((error) => error !== undefined).length;
  const tries = useRef(0);
  // Focus is outside React: after a try that failed it goes to the first wrong field.
  useEffect(() => {
    if (tries.current === 0 || wrong === 0) return;
    tries.current = 0;
    element.current?.querySelector<HTMLElement>("[aria-invalid=true]")?.focus();
  });
  const onSubmit = (event: FormEvent) => {
    event.preventDefault();
    tries.current++;
    void form.submit();
  };
  return (
    <form ref={element} noValidate onSubmit={onSubmit} className="grid gap-5">
      {form.restored_at === null ? null : <Restored form={form} saved_at={form.restored_at} />}
      {props.children}
      {form.problem === null ? null : <FaultPanel problem={form.problem} />}
      <div className="flex flex-wrap items-center gap-x-4 gap-y-2">
        <Button
          type="submit"
          kind="primary"
          busy={form.isBusy}
          {...(props.large === true && { large: true })}
        >
          {props.action}
        </Button>
        {props.aside}
        <p role="status" className="font-medium text-stop">
          {wrong === 0 ? null : wrong === 1 ? "One field needs mending." : `${wrong} fields need mending.`}
        </p>
      </div>
    </form>
  );
}

function Restored(props: { form: FormState; saved_at: string }): ReactElement {
  return (
    <div className="flex flex-wrap items-center justify-between gap-x-4 rounded-sm border border-l-[3px] border-rule border-l-spark bg-hush px-4 py-1.5">
      <p>What you typed on {formatInstant(props.saved_at)} was kept and is back.</p>
      <Button kind="quiet" onClick={props.form.startAnew}>
        Begin anew
      </Button>
    </div>
  );
}
