import { type FormEvent, type ReactElement, type ReactNode, useEffect, useId, useRef, useState } from "react";
import { PasswordField } from "../fields/password-field.tsx";
import { Button } from "./button.tsx";

export interface ConfirmDialogProps {
  open: boolean;
  onClose: () => void;
  /** What is asked: "Hold 12 parts?" */
  title: string;
  /** What it will do, in numbers. */
  children: ReactNode;
  /** The deed itself: "Hold 12 parts". */
  action: string;
  /** danger for what stops or cannot be taken back. */
  kind?: "primary" | "danger";
  /** Asks for the password, where a signature is meant. */
  signature?: boolean;
  /** Why it was refused, such as a wrong password. */
  error?: string;
  busy?: boolean;
  onConfirm: (password: string) => void;
}

/** Asks before a deed that matters: says in numbers what it will do, and takes a signature where one is meant. */
export function ConfirmDialog(props: ConfirmDialogProps): ReactElement {
  const id = useId();
  const dialog = useRef<HTMLDialogElement>(null);
  const [password, setPassword] = useState("");
  // The browser's dialog is opened and closed by call, not by attribute.
  useEffect(() => {
    if (props.open && dialog.current?.open === false) dialog.current.showModal();
    if (!props.open && dialog.current?.open === true) dialog.current.close();
  }, [props.open]);
  const confirm = (event: FormEvent) => {
    event.preventDefault();
    props.onConfirm(password);
    setPassword("");
  };
  const isDanger = props.kind === "danger";
  return (
    <dialog
      ref={dialog}
      aria-labelledby={id}
      onClose={props.onClose}
      className={`m-auto w-[min(34rem,calc(100vw-2rem))] rounded-sm border border-t-[3px] border-rule bg-sheet p-0 text-ink shadow-float ${isDanger ? "border-t-stop" : "border-t-sheet-rule"}`}
    >
      <form onSubmit={confirm} className="grid gap-4 px-6 pt-5 pb-6">
        <h2 id={id} className="text-xl">
          {props.title}
        </h2>
        <div className="grid gap-2">{props.children}</div>
        {props.signature === true ? (
          <PasswordField
            label="Your password, as your signature"
            name="password"
            value={password}
            onChange={setPassword}
            error={props.error}
          />
        ) : props.error === undefined ? null : (
          <p role="alert" className="font-medium text-stop">
            <span aria-hidden="true">◆ </span>
            {props.error}
          </p>
        )}
        <div className="flex flex-wrap gap-3">
          <Button
            type="submit"
            kind={props.kind ?? "primary"}
            busy={props.busy === true}
            disabled={props.signature === true && password === ""}
          >
            {props.action}
          </Button>
          <Button onClick={props.onClose}>Leave as it is</Button>
        </div>
      </form>
    </dialog>
  );
}
