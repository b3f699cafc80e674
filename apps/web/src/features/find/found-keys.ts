import { type RefObject, useEffect } from "react";

const STEPS: Readonly<Record<string, number>> = { ArrowDown: 1, ArrowUp: -1 };
/** From here, too, the arrow leads into the list: the heading that has the focus after a search, the search field. */
const DOORS = "body, h1, input[type=search]";

/**
 * The place that an arrow key leads to in a list.
 * @param here the place that has the focus, -1 when none has
 * @returns null when the key leads nowhere: another key, an empty list, up from outside
 */
export function nextFound(key: string, here: number, count: number): number | null {
  const step = STEPS[key];
  if (step === undefined || count === 0) return null;
  if (here < 0) return step > 0 ? 0 : null;
  return Math.max(0, Math.min(count - 1, here + step));
}

/** Arrow keys go from link to link of the list, and into it from the search field and from the page's heading. */
export function useFoundKeys(list: RefObject<HTMLElement | null>): void {
  // The keys are pressed in the search field and on the heading too, which are outside this part of the page.
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (event.ctrlKey || event.metaKey || event.altKey || event.shiftKey) return;
      if (!(event.target instanceof HTMLElement)) return;
      const links = [...(list.current?.querySelectorAll<HTMLElement>("a[data-found]") ?? [])];
      const here = links.indexOf(event.target);
      if (here < 0 && !event.target.matches(DOORS)) return;
      const next = nextFound(event.key, here, links.length);
      if (next === null) return;
      event.preventDefault();
      links[next]?.focus();
    };
    document.addEventListener("keydown", onKey);
    return () => document.removeEventListener("keydown", onKey);
  }, [list]);
}
