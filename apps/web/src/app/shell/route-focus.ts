import { type RefObject, useEffect, useRef } from "react";
import { useLocation } from "react-router";
import { announce } from "../../kit/states/announcements.ts";

/** After a change of page: the heading takes the focus and is read out, as soon as it is there. */
export function useRouteFocus(main: RefObject<HTMLElement | null>): void {
  const { pathname } = useLocation();
  const before = useRef(pathname);
  // Focus and the announcement live outside React; the first load leaves focus with the browser.
  useEffect(() => {
    if (before.current === pathname || main.current === null) return undefined;
    before.current = pathname;
    return whenHeadingAppears(main.current, (heading) => {
      heading.tabIndex = -1;
      heading.focus({ preventScroll: true });
      announce(heading.textContent ?? "");
    });
  }, [pathname, main]);
}

/** Calls once with the page's h1, now or when its data has come; the answer stops the waiting. */
function whenHeadingAppears(main: HTMLElement, then: (heading: HTMLElement) => void): () => void {
  const heading = main.querySelector("h1");
  if (heading !== null) {
    then(heading);
    return () => undefined;
  }
  const observer = new MutationObserver(() => {
    const late = main.querySelector("h1");
    if (late === null) return;
    observer.disconnect();
    then(late);
  });
  observer.observe(main, { childList: true, subtree: true });
  return () => observer.disconnect();
}
