import { type FormEvent, type ReactElement, useEffect, useRef } from "react";
import { useLocation, useNavigate } from "react-router";
import { shortcutChoice } from "../choices/shortcuts.ts";
import { findPath, PATHS } from "../paths.ts";

const EDITABLE = "input, textarea, select, [contenteditable]";

/** The one door: a tag, serial, heat, wire lot, name, drawing or order. */
export function FindField(): ReactElement {
  const input = useRef<HTMLInputElement>(null);
  const navigate = useNavigate();
  useSlashFocus(input);
  useSearchedText(input);
  const find = (event: FormEvent) => {
    event.preventDefault();
    const text = input.current?.value.trim() ?? "";
    if (text !== "") void navigate(findPath(text));
  };
  return (
    <search className="flex-1 max-lg:mb-3 lg:ml-auto lg:max-w-80 lg:min-w-36">
      <form action="/find" onSubmit={find}>
        <input
          ref={input}
          type="search"
          name="q"
          aria-label="Find by tag, serial, heat, lot or name"
          aria-keyshortcuts="/"
          placeholder="Tag, serial, heat, name…"
          autoComplete="off"
          autoCapitalize="off"
          spellCheck={false}
          className="figures h-9 w-full rounded-sm border border-transparent bg-field-on-soot px-3 text-on-soot placeholder:text-ash-on-soot max-lg:h-11"
        />
      </form>
    </search>
  );
}

/** "/" puts the cursor into the field, unless somebody is typing or has switched the shortcut off. */
function useSlashFocus(input: React.RefObject<HTMLInputElement | null>): void {
  // The key is pressed anywhere on the page, outside React's own tree.
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (event.key !== "/" || event.ctrlKey || event.metaKey || event.altKey) return;
      if (shortcutChoice.read() === "off") return;
      if (event.target instanceof Element && event.target.closest(EDITABLE) !== null) return;
      event.preventDefault();
      input.current?.focus();
      input.current?.select();
    };
    document.addEventListener("keydown", onKey);
    return () => document.removeEventListener("keydown", onKey);
  }, [input]);
}

/** On the page of a search the field holds what was searched for, to be changed; every other page empties it. */
function useSearchedText(input: React.RefObject<HTMLInputElement | null>): void {
  const { pathname, search } = useLocation();
  // The field keeps its own text while somebody types; only a change of address sets it.
  useEffect(() => {
    if (input.current === null) return;
    const searched = pathname === PATHS.find.path ? new URLSearchParams(search).get("q") : null;
    input.current.value = searched ?? "";
  }, [input, pathname, search]);
}
