import { type ReactElement, type ReactNode, useRef } from "react";
import { ScrollRestoration } from "react-router";
import { Announcer } from "../kit/states/announcer.tsx";
import { FindField } from "./shell/find-field.tsx";
import { MainNav, NarrowNav } from "./shell/main-nav.tsx";
import { NavigationProgress } from "./shell/navigation-progress.tsx";
import { useRouteFocus } from "./shell/route-focus.ts";
import { UserMenu } from "./shell/user-menu.tsx";

/** Who is signed in, as the bar shows it. The session hands this in; nobody signed in is null. */
export interface ShellPerson {
  readonly name: string;
  readonly role: string;
  readonly onSignOut: () => void;
}

/** The frame of every page: the soot bar with its one door, and the page beneath it. */
export function Shell(props: {
  person: ShellPerson | null;
  /** At the door there is nowhere to go and nothing to find yet. */
  isDoor?: boolean;
  children: ReactNode;
}): ReactElement {
  const main = useRef<HTMLElement>(null);
  useRouteFocus(main);
  return (
    <>
      <a
        href="#page"
        className="screen-only fixed top-2 left-2 z-50 -translate-y-20 rounded-sm bg-sheet px-4 py-3 font-medium text-link focus:translate-y-0"
      >
        Skip to the page
      </a>
      <header className="screen-only on-soot top-0 z-30 max-lg:relative lg:sticky">
        <div className="mx-auto flex min-h-14 max-w-[100rem] flex-wrap items-center gap-x-7 px-4 max-xl:gap-x-5 max-lg:gap-x-3 sm:px-6">
          <Wordmark />
          {props.isDoor === true ? (
            <div className="ml-auto" />
          ) : (
            <>
              <MainNav />
              <NarrowNav />
              <div className="h-0 basis-full lg:hidden" />
              <FindField />
            </>
          )}
          <UserMenu person={props.person} />
        </div>
        <NavigationProgress />
      </header>
      <main
        id="page"
        ref={main}
        tabIndex={-1}
        className="mx-auto max-w-[100rem] px-4 pt-6 pb-16 outline-none sm:px-6"
      >
        {props.children}
      </main>
      <Announcer />
      <ScrollRestoration />
    </>
  );
}

function Wordmark(): ReactElement {
  return (
    <a
      href="/"
      className="py-3 font-title text-[1.4375rem] leading-8 font-semibold tracking-[0.045em] text-on-soot no-underline"
    >
      BEADROLL
    </a>
  );
}
