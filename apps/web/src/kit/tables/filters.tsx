import { type ReactElement, useEffect, useRef, useState } from "react";

/** How long a filter waits for the next key before it filters. */
const PAUSE_MS = 200;

const CONTROL = "min-h-9 rounded-sm border border-edge bg-sheet px-2.5 text-ink placeholder:text-ash";

export interface FilterTextProps {
  label: string;
  /** As it stands in the URL. */
  value: string;
  onChange: (value: string) => void;
  placeholder?: string;
}

/** A filter by text, above a table; it waits for a pause in typing. */
export function FilterText(props: FilterTextProps): ReactElement {
  const { value, onChange } = props;
  const [typed, setTyped] = useState(value);
  const sent = useRef(value);
  // The URL and a timer are outside React: a value from elsewhere takes the field over, one of its own does not.
  useEffect(() => {
    if (value === sent.current) return;
    sent.current = value;
    setTyped(value);
  }, [value]);
  useEffect(() => {
    if (typed === sent.current) return undefined;
    const timer = setTimeout(() => {
      sent.current = typed;
      onChange(typed);
    }, PAUSE_MS);
    return () => clearTimeout(timer);
  }, [typed, onChange]);
  return (
    <label className="grid gap-1 text-sm text-ash">
      {props.label}
      <input
        type="search"
        value={typed}
        placeholder={props.placeholder}
        onChange={(event) => setTyped(event.target.value)}
        className={`${CONTROL} w-56`}
      />
    </label>
  );
}

export interface FilterChoiceProps<T extends string> {
  label: string;
  value: T | "";
  onChange: (value: T | "") => void;
  options: readonly { readonly value: T; readonly label: string }[];
  /** The word for no filter. */
  all?: string;
}

/** A filter by one of a few, above a table. */
export function FilterChoice<T extends string>(props: FilterChoiceProps<T>): ReactElement {
  return (
    <label className="grid gap-1 text-sm text-ash">
      {props.label}
      <select
        value={props.value}
        onChange={(event) =>
          props.onChange(props.options.find((option) => option.value === event.target.value)?.value ?? "")
        }
        className={`${CONTROL} pr-8`}
      >
        <option value="">{props.all ?? "All"}</option>
        {props.options.map((option) => (
          <option key={option.value} value={option.value}>
            {option.label}
          </option>
        ))}
      </select>
    </label>
  );
}
