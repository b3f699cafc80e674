import { type ReactElement, useId } from "react";
import { Button } from "../actions/button.tsx";

export interface ColumnChoiceProps {
  columns: readonly { readonly id: string; readonly head: string }[];
  shown: ReadonlySet<string>;
  onChange: (shown: ReadonlySet<string>) => void;
}

/** Which columns a table shows; at least one stays. */
export function ColumnChoice(props: ColumnChoiceProps): ReactElement {
  const id = useId();
  const toggle = (column: string) => {
    const next = new Set(props.shown);
    if (!next.delete(column)) next.add(column);
    if (next.size > 0) props.onChange(next);
  };
  return (
    <>
      <Button kind="quiet" popoverTarget={id}>
        Columns
      </Button>
      <div
        id={id}
        popover="auto"
        className="m-auto w-72 rounded-sm border border-t-[3px] border-rule border-t-sheet-rule bg-sheet p-4 text-ink shadow-float"
      >
        <fieldset>
          <legend className="mb-2 font-title text-lg font-semibold">Columns shown</legend>
          {props.columns.map((column) => (
            <label key={column.id} className="flex min-h-8 items-center gap-2.5">
              <input
                type="checkbox"
                className="size-4 accent-(--act)"
                checked={props.shown.has(column.id)}
                onChange={() => toggle(column.id)}
              />
              {column.head}
            </label>
          ))}
        </fieldset>
        <div className="mt-3">
          <Button popoverTarget={id} popoverTargetAction="hide">
            Done
          </Button>
        </div>
      </div>
    </>
  );
}
