import { type ReactElement, useId } from "react";
import { shortcutChoice, useShortcutChoice } from "../choices/shortcuts.ts";
import { unitsChoice, useUnitsChoice } from "../choices/units.ts";
import type { ShellPerson } from "../shell.tsx";
import { chooseTheme, useThemeChoice } from "../theme.ts";

/** Who is signed in, and how this screen looks and counts. */
export function UserMenu(props: { person: ShellPerson | null }): ReactElement {
  const id = useId();
  const theme = useThemeChoice();
  const units = useUnitsChoice();
  const shortcuts = useShortcutChoice();
  return (
    <>
      <button
        type="button"
        popoverTarget={id}
        className={`-mr-2 flex h-9 items-center gap-2 lg:-ml-3 rounded-sm px-2 text-sm font-semibold whitespace-nowrap text-on-soot hover:bg-field-on-soot max-lg:h-11 ${props.person === null ? "" : "max-lg:mb-3"}`}
      >
        {props.person?.name ?? "Screen"}
        <span
          aria-hidden="true"
          className="size-0 border-x-4 border-t-5 border-x-transparent border-t-ash-on-soot"
        />
      </button>
      <div
        id={id}
        popover="auto"
        className="fixed inset-auto top-15 max-lg:top-29 right-4 m-0 w-72 rounded-sm border border-rule bg-sheet p-0 text-ink shadow-float [--focus:var(--link)] sm:right-6"
      >
        {props.person === null ? null : <Identity person={props.person} />}
        <div className="grid gap-4 px-4 py-4">
          <Choice
            legend="Theme"
            options={{ light: "Light", night: "Night", system: "System" }}
            value={theme}
            onChoose={chooseTheme}
          />
          <Choice
            legend="Lengths in"
            options={{ mm: "mm", in: "inches" }}
            value={units}
            onChoose={unitsChoice.write}
          />
          <Choice
            legend="Key / goes to search"
            options={{ on: "On", off: "Off" }}
            value={shortcuts}
            onChoose={shortcutChoice.write}
          />
        </div>
        {props.person === null ? null : (
          <div className="border-t border-row px-4 py-3">
            <button
              type="button"
              onClick={props.person.onSignOut}
              className="py-1 font-medium text-link hover:underline"
            >
              Sign out
            </button>
          </div>
        )}
      </div>
    </>
  );
}

function Identity(props: { person: ShellPerson }): ReactElement {
  return (
    <div className="border-b border-row px-4 py-3">
      <div className="font-semibold">{props.person.name}</div>
      <div className="text-sm text-ash">{props.person.role}</div>
    </div>
  );
}

interface ChoiceProps<T extends string> {
  legend: string;
  options: Record<T, string>;
  value: T;
  onChoose: (choice: T) => void;
}

function Choice<T extends string>(props: ChoiceProps<T>): ReactElement {
  const name = useId();
  const values = Object.keys(props.options).filter((key): key is T => key in props.options);
  return (
    <fieldset>
      <legend className="mb-1 text-sm text-ash">{props.legend}</legend>
      <div className="flex">
        {values.map((value) => (
          <label
            key={value}
            className="relative -ml-px flex-1 border border-edge px-2 py-1.5 text-center text-sm font-medium first:ml-0 first:rounded-l-sm last:rounded-r-sm has-checked:bg-act has-checked:text-on-act has-focus-visible:z-10 has-focus-visible:outline-2 has-focus-visible:outline-offset-2 has-focus-visible:outline-(--focus)"
          >
            <input
              type="radio"
              name={name}
              value={value}
              checked={props.value === value}
              onChange={() => props.onChoose(value)}
              className="absolute inset-0 cursor-pointer appearance-none outline-none"
            />
            {props.options[value]}
          </label>
        ))}
      </div>
    </fieldset>
  );
}
