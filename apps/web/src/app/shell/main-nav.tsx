import { type ReactElement, useId, useState } from "react";
import { NavLink, useLocation } from "react-router";
import { type NavEntry, navEntries, pageModule } from "../page-modules.ts";
import { useAccount } from "../session.ts";

const ENTRIES = navEntries((name) => pageModule(name) !== undefined);

/** The words for whoever is signed in; none before. */
function useEntries(): readonly NavEntry[] {
  const account = useAccount();
  if (account === null) return [];
  return ENTRIES.filter(({ needs }) => needs === null || account.permissions.includes(needs));
}

/** The words of the bar on a wide screen; where you are is marked with the spark. */
export function MainNav(): ReactElement | null {
  const entries = useEntries();
  if (entries.length === 0) return null;
  return (
    <nav aria-label="Main" className="self-stretch max-lg:hidden">
      <ul className="flex h-full gap-7 max-xl:gap-4">
        {entries.map((entry) => (
          <li key={entry.path} className="flex items-center">
            <NavLink
              to={entry.path}
              className="relative -mx-2 flex h-9 items-center rounded-sm px-2 text-sm font-semibold text-ash-on-soot no-underline hover:text-on-soot aria-[current=page]:text-on-soot aria-[current=page]:after:absolute aria-[current=page]:after:inset-x-2 aria-[current=page]:after:-bottom-2.5 aria-[current=page]:after:h-[3px] aria-[current=page]:after:bg-spark"
            >
              {entry.nav}
            </NavLink>
          </li>
        ))}
      </ul>
    </nav>
  );
}

/** The same words behind a button, where the screen is narrow; they fold away when one is chosen. */
export function NarrowNav(): ReactElement | null {
  const id = useId();
  const entries = useEntries();
  const { pathname } = useLocation();
  const [openOn, setOpenOn] = useState<string | null>(null);
  const isOpen = openOn === pathname;
  if (entries.length === 0) return null;
  return (
    <>
      <button
        type="button"
        aria-expanded={isOpen}
        aria-controls={id}
        onClick={() => setOpenOn(isOpen ? null : pathname)}
        className="-mr-2 ml-auto flex h-11 items-center rounded-sm px-2 text-sm font-semibold text-on-soot lg:hidden"
      >
        {isOpen ? "Close menu" : "Menu"}
      </button>
      <nav id={id} aria-label="Main" hidden={!isOpen} className="w-full pb-4 lg:hidden">
        <ul className="grid grid-cols-2 gap-x-6">
          {entries.map((entry) => (
            <li key={entry.path}>
              <NavLink
                to={entry.path}
                className="flex min-h-12 items-center border-t border-field-on-soot font-medium text-on-soot no-underline aria-[current=page]:border-t-spark aria-[current=page]:text-spark"
              >
                {entry.nav}
              </NavLink>
            </li>
          ))}
        </ul>
      </nav>
    </>
  );
}
