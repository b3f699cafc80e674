import { type ReactElement, useId } from "react";

export interface ChoiceFieldProps<T extends string> {
  label: string;
  name: string;
  value: T | "";
  onChange: (value: T) => void;
  /** All of them are seen at once; for more than five take a SelectField. */
  options: readonly { readonly value: T; readonly label: string }[];
  limit?: string | undefined;
  error?: string | undefined;
  /** Unused by the drawing; lets a form's binding be spread. */
  optional?: boolean | undefined;
  large?: boolean;
}

/** One of a few, all in view, pressed with one touch. */
export function ChoiceField<T extends string>(props: ChoiceFieldProps<T>): ReactElement {
  const id = useId();
  const { error, limit } = props;
  const described = [limit && `${id}-limit`, error && `${id}-error`].filter(Boolean).join(" ");
  const size = props.large === true ? "min-h-12 px-5 text-lg" : "min-h-9 px-4";
  return (
    <fieldset aria-describedby={described === "" ? undefined : described}>
      <legend className="mb-1 font-medium">{props.label}</legend>
      <div className="flex flex-wrap items-center gap-x-4 gap-y-1">
        <div className="flex flex-wrap">
          {props.options.map((option) => (
            <label
              key={option.value}
              className={`relative -ml-px flex items-center border border-edge bg-sheet font-medium first:ml-0 first:rounded-l-sm last:rounded-r-sm hover:bg-hush has-checked:border-act has-checked:bg-act has-checked:text-on-act has-focus-visible:z-10 has-focus-visible:outline-2 has-focus-visible:outline-offset-2 has-focus-visible:outline-(--focus) ${size}`}
            >
              <input
                type="radio"
                name={props.name}
                value={option.value}
                checked={props.value === option.value}
                aria-invalid={error === undefined ? undefined : true}
                onChange={() => props.onChange(option.value)}
                className="absolute inset-0 cursor-pointer appearance-none outline-none"
              />
              {option.label}
            </label>
          ))}
        </div>
        {error === undefined ? null : (
          <p id={`${id}-error`} className="font-medium text-stop">
            <span aria-hidden="true">◆ </span>
            {error}
          </p>
        )}
      </div>
      {limit === undefined ? null : (
        <p id={`${id}-limit`} className="mt-1 text-sm text-ash">
          {limit}
        </p>
      )}
    </fieldset>
  );
}
