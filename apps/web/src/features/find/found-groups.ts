import type { FOUND_KINDS, Found } from "@beadroll/domain/schemas/find";
import { PATHS, pathTo } from "../../app/paths.ts";

type FoundKind = (typeof FOUND_KINDS)[number];

/** Kinds as headings, in the order in which people look for them. */
const HEADINGS: Readonly<Record<FoundKind, string>> = {
  part: "Parts",
  seam: "Seams",
  lot: "Lots",
  drawing: "Drawings",
  procedure: "Procedures",
  person: "People",
  cell: "Cells",
};

/** What a search found of one kind. */
export interface FoundGroup {
  readonly kind: FoundKind;
  readonly heading: string;
  readonly items: readonly Found[];
}

/** Groups by kind: the kind of the best match first, the others in their usual order. */
export function foundGroups(items: readonly Found[]): FoundGroup[] {
  const usual = Object.keys(HEADINGS) as FoundKind[];
  const [best] = items;
  const order = best === undefined ? usual : [best.kind, ...usual.filter((kind) => kind !== best.kind)];
  return order.flatMap((kind) => {
    const own = items.filter((item) => item.kind === kind);
    return own.length === 0 ? [] : [{ kind, heading: HEADINGS[kind], items: own }];
  });
}

/** The server names no more of a kind than this. */
const PER_KIND = 12;

/** Whether there may be more of the kind than the answer names. */
export const isCut = (group: FoundGroup): boolean => group.items.length >= PER_KIND;

/** The floor with one cell alone, as a cell's own screen shows it. */
const cellPath = (tag: string): string =>
  `${PATHS.floor.path}?${new URLSearchParams({ cell: tag }).toString()}`;

/** The one thing that a whole tag found, or null. Anything else is for people to choose from. */
export function soleTagged(items: readonly Found[], tag: string): Found | null {
  const [only, ...others] = items;
  return only?.tag === tag && others.length === 0 ? only : null;
}

/** Where a found thing's page is. */
export function foundPath({ kind, tag, id }: Found): string {
  switch (kind) {
    case "part":
    case "seam":
    case "lot":
    case "person":
      return tag === null ? PATHS.floor.path : pathTo(kind, { tag });
    case "drawing":
    case "procedure":
      return pathTo(kind, { id });
    case "cell":
      return tag === null ? PATHS.floor.path : cellPath(tag);
  }
}
