import { type ReactElement, useState } from "react";
import { fromMm } from "../units/length-units.ts";
import { useLengthUnits } from "../units/units-context.tsx";
import { Field, type FieldProps } from "./field.tsx";
import { numberText, readLength, readNumber } from "./number-text.ts";

export interface NumberFieldProps extends FieldProps {
  /** The number in the field's unit; a length always in mm. Null where nothing stands. */
  value: number | null;
  onChange: (value: number | null) => void;
  /** Stands inside the field. A field in "mm" follows the units of the screen. */
  unit?: string | undefined;
}

/** A number with its unit inside the field. Takes comma or point; a length in mm or in, fractions of an inch too. */
export function NumberField(props: NumberFieldProps): ReactElement {
  const units = useLengthUnits();
  const isLength = props.unit === "mm";
  const shownUnit = isLength ? units : props.unit;
  const read = (text: string) => (isLength ? readLength(text, units) : readNumber(text));
  const write = (value: number | null) =>
    isLength && value !== null ? numberText(fromMm(value, units), units === "mm" ? 4 : 6) : numberText(value);
  // What is being typed stays as typed; it gives way when the value is changed from outside.
  const [typed, setTyped] = useState<{ text: string; value: number | null } | null>(null);
  const text = typed !== null && typed.value === props.value ? typed.text : write(props.value);
  const reading = read(text);
  const error = reading.ok ? props.error : reading.words;
  const change = (next: string) => {
    const result = read(next);
    const value = result.ok ? result.value : null;
    setTyped({ text: next, value });
    props.onChange(value);
  };
  return (
    <Field {...props} error={error}>
      {({ className, ...control }) => (
        <div className="relative">
          <input
            {...control}
            type="text"
            inputMode="decimal"
            autoComplete="off"
            value={text}
            onChange={(event) => change(event.target.value)}
            onBlur={() => reading.ok && setTyped(null)}
            className={`${className} font-mono tabular-nums ${shownUnit === undefined ? "" : "pr-16"}`}
          />
          {shownUnit === undefined ? null : (
            <span className="pointer-events-none absolute inset-y-0 right-3 flex items-center text-ash">
              {shownUnit}
            </span>
          )}
        </div>
      )}
    </Field>
  );
}
