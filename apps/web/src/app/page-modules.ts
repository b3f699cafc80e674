import type { Permission } from "@beadroll/domain/auth/permissions";
import type { ComponentType } from "react";
import type { LoaderFunction } from "react-router";
import { PATHS, type PageEntry, type PageName } from "./paths.ts";

/** What a page's file exports: the page itself and, if it needs data, its loader. */
export interface PageModule {
  readonly default: ComponentType;
  readonly loader?: LoaderFunction;
}

const MODULES = import.meta.glob<PageModule>("../pages/*-page.tsx");

/** The function that fetches a page's code, or undefined while the page is not written. */
export function pageModule(name: PageName): (() => Promise<PageModule>) | undefined {
  return MODULES[`../pages/${PATHS[name].file}-page.tsx`];
}

/** A word of the top bar. */
export interface NavEntry {
  readonly name: PageName;
  readonly path: string;
  readonly nav: string;
  readonly needs: Permission | null;
}

/** The words of the top bar, in order, for the pages that exist. */
export function navEntries(exists: (name: PageName) => boolean): NavEntry[] {
  return pageNames().flatMap((name) => {
    const entry: PageEntry = PATHS[name];
    return entry.nav !== undefined && exists(name)
      ? [{ name, path: entry.path, nav: entry.nav, needs: entry.needs ?? null }]
      : [];
  });
}

/** The names of all pages in the table. */
export function pageNames(): PageName[] {
  return Object.keys(PATHS).filter((name): name is PageName => name in PATHS);
}
