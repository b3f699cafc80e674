import { type ReactElement, useEffect, useId, useRef } from "react";
import { LabelsForm } from "./labels-form.tsx";

/** Asks how labels are to be printed. */
export function LabelsDialog(props: {
  tag: string;
  serial: string;
  open: boolean;
  onClose: () => void;
}): ReactElement {
  const id = useId();
  const dialog = useRef<HTMLDialogElement>(null);
  // The browser's dialog is opened and closed by call, not by attribute.
  useEffect(() => {
    if (props.open && dialog.current?.open === false) dialog.current.showModal();
    if (!props.open && dialog.current?.open === true) dialog.current.close();
  }, [props.open]);
  return (
    <dialog
      ref={dialog}
      aria-labelledby={id}
      onClose={props.onClose}
      className="m-auto w-[min(40rem,calc(100vw-2rem))] rounded-sm border border-t-[3px] border-rule border-t-sheet-rule bg-sheet p-0 text-ink shadow-float"
    >
      <div className="grid gap-4 px-6 pt-5 pb-6">
        <h2 id={id} className="text-xl">
          Labels of {props.serial}
        </h2>
        {props.open ? <LabelsForm tag={props.tag} serial={props.serial} onDone={props.onClose} /> : null}
      </div>
    </dialog>
  );
}
