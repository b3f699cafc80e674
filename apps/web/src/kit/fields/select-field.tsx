import type { ReactElement } from "react";
import { Field, type FieldProps } from "./field.tsx";

export interface SelectFieldProps<T extends string> extends FieldProps {
  value: T | "";
  onChange: (value: T) => void;
  options: readonly { readonly value: T; readonly label: string }[];
  /** Stands in the field while nothing is chosen. */
  prompt?: string;
}

/** One of a few. */
export function SelectField<T extends string>(props: SelectFieldProps<T>): ReactElement {
  const choose = (text: string) => {
    const option = props.options.find((candidate) => candidate.value === text);
    if (option !== undefined) props.onChange(option.value);
  };
  return (
    <Field {...props}>
      {({ className, ...control }) => (
        <select
          {...control}
          value={props.value}
          onChange={(event) => choose(event.target.value)}
          className={`${className} pr-8`}
        >
          {props.value === "" ? <option value="">{props.prompt ?? "Choose…"}</option> : null}
          {props.options.map((option) => (
            <option key={option.value} value={option.value}>
              {option.label}
            </option>
          ))}
        </select>
      )}
    </Field>
  );
}
