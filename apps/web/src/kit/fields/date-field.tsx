import type { ReactElement } from "react";
import { Field, type FieldProps } from "./field.tsx";

export interface DateFieldProps extends FieldProps {
  /** YYYY-MM-DD, or "" where no day is chosen. */
  value: string;
  onChange: (value: string) => void;
  /** First and last day that may be chosen, YYYY-MM-DD. */
  min?: string;
  max?: string;
}

/** A day, in the browser's own calendar. */
export function DateField(props: DateFieldProps): ReactElement {
  return (
    <Field {...props}>
      {({ className, ...control }) => (
        <input
          {...control}
          type="date"
          value={props.value}
          min={props.min}
          max={props.max}
          onChange={(event) => props.onChange(event.target.value)}
          className={`${className} font-mono sm:max-w-44`}
        />
      )}
    </Field>
  );
}
