import { type ReactElement, useState } from "react";
import { Field, type FieldProps } from "./field.tsx";

export interface PasswordFieldProps extends FieldProps {
  value: string;
  onChange: (value: string) => void;
  /** new-password where one is chosen, current-password where one is asked for. */
  autoComplete?: "current-password" | "new-password";
}

/** A password; it can be shown, as gloves and small keys make mistakes. */
export function PasswordField(props: PasswordFieldProps): ReactElement {
  const [isShown, setShown] = useState(false);
  return (
    <Field {...props}>
      {({ className, ...control }) => (
        <div className="relative">
          <input
            {...control}
            type={isShown ? "text" : "password"}
            value={props.value}
            autoComplete={props.autoComplete ?? "current-password"}
            autoCapitalize="off"
            spellCheck={false}
            onChange={(event) => props.onChange(event.target.value)}
            className={`${className} pr-16`}
          />
          <button
            type="button"
            aria-label={isShown ? "Hide the password" : "Show the password"}
            onClick={() => setShown(!isShown)}
            className="absolute inset-y-0 right-0 px-3 text-sm font-medium text-link -outline-offset-2! hover:underline"
          >
            {isShown ? "Hide" : "Show"}
          </button>
        </div>
      )}
    </Field>
  );
}
