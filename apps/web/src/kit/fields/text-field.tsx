import type { ReactElement } from "react";
import { Field, type FieldProps } from "./field.tsx";

export interface TextFieldProps extends FieldProps {
  value: string;
  onChange: (value: string) => void;
  /** Codes (tags, heats, serials) in the mono face, without correction. */
  code?: boolean;
  /** Several lines. */
  lines?: number;
  autoComplete?: string;
  maxLength?: number | undefined;
  placeholder?: string;
}

/** One line of text, or several. */
export function TextField(props: TextFieldProps): ReactElement {
  const code = props.code === true;
  const shared = {
    value: props.value,
    maxLength: props.maxLength,
    placeholder: props.placeholder,
    autoComplete: props.autoComplete ?? "off",
    spellCheck: code ? false : undefined,
    autoCapitalize: code ? "characters" : undefined,
  };
  return (
    <Field {...props}>
      {({ className, ...control }) =>
        props.lines === undefined ? (
          <input
            {...control}
            {...shared}
            type="text"
            onChange={(event) => props.onChange(event.target.value)}
            className={`${className} ${code ? "font-mono" : ""}`}
          />
        ) : (
          <textarea
            {...control}
            {...shared}
            rows={props.lines}
            onChange={(event) => props.onChange(event.target.value)}
            className={`${className} py-1.5`}
          />
        )
      }
    </Field>
  );
}
