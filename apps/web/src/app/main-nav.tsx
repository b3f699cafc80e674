import type { ReactElement } from "react";
import { NavLink } from "react-router";
import { navEntries, pageModule } from "./page-modules.ts";

const ENTRIES = navEntries((name) => pageModule(name) !== undefined);

/** The words of the bar on a wide screen; where you are is marked with the spark. */
export function MainNav(): ReactElement | null {
  if (ENTRIES.length === 0) return null;
  return (
    <nav aria-label="Main" className="self-stretch max-lg:hidden">
      <ul className="flex h-full gap-7">
        {ENTRIES.map((entry) => (
          <li key={entry.path} className="flex">
            <NavLink
              to={entry.path}
              className="relative flex items-center text-sm font-medium text-ash-on-soot no-underline hover:text-on-soot aria-[current=page]:text-on-soot aria-[current=page]:after:absolute aria-[current=page]:after:inset-x-0 aria-[current=page]:after:bottom-0 aria-[current=page]:after:h-[3px] aria-[current=page]:after:bg-spark"
            >
              {entry.nav}
            </NavLink>
          </li>
        ))}
      </ul>
    </nav>
  );
}

/** The same words in one line that scrolls sideways, where the screen is narrow. */
export function NarrowNav(): ReactElement | null {
  if (ENTRIES.length === 0) return null;
  return (
    <nav aria-label="Main" className="order-3 -mx-4 w-screen overflow-x-auto px-4 lg:hidden">
      <ul className="flex gap-6">
        {ENTRIES.map((entry) => (
          <li key={entry.path}>
            <NavLink
              to={entry.path}
              className="block border-b-[3px] border-transparent py-3 text-sm font-medium whitespace-nowrap text-ash-on-soot no-underline aria-[current=page]:border-spark aria-[current=page]:text-on-soot"
            >
              {entry.nav}
            </NavLink>
          </li>
        ))}
      </ul>
    </nav>
  );
}
