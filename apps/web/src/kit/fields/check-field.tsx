import { type ReactElement, useId } from "react";

export interface CheckFieldProps {
  label: string;
  name: string;
  value: boolean;
  onChange: (value: boolean) => void;
  error?: string | undefined;
  disabled?: boolean;
  large?: boolean;
}

/** Yes or no; the whole line can be pressed. */
export function CheckField(props: CheckFieldProps): ReactElement {
  const id = useId();
  const { error } = props;
  return (
    <div>
      <label className={`flex items-center gap-2.5 ${props.large === true ? "min-h-12 text-lg" : "min-h-8"}`}>
        <input
          type="checkbox"
          name={props.name}
          checked={props.value}
          disabled={props.disabled}
          aria-invalid={error === undefined ? undefined : true}
          aria-describedby={error === undefined ? undefined : id}
          onChange={(event) => props.onChange(event.target.checked)}
          className={`shrink-0 accent-(--act) ${props.large === true ? "size-6" : "size-4"}`}
        />
        {props.label}
      </label>
      {error === undefined ? null : (
        <p id={id} className="font-medium text-stop">
          <span aria-hidden="true">◆ </span>
          {error}
        </p>
      )}
    </div>
  );
}
