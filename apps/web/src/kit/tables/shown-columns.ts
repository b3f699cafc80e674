import { useState } from "react";
import type { Column } from "./columns.ts";

/** The ids of the columns shown, kept in this browser under `storeKey`, and the way to change them. */
export function useShownColumns<Row>(
  columns: readonly Column<Row>[],
  storeKey: string | undefined,
): [ReadonlySet<string>, (shown: ReadonlySet<string>) => void] {
  const key = storeKey === undefined ? null : `beadroll.columns.${storeKey}`;
  const [shown, setShown] = useState<ReadonlySet<string>>(() => readShown(columns, key));
  const change = (next: ReadonlySet<string>) => {
    setShown(next);
    if (key === null) return;
    try {
      localStorage.setItem(key, [...next].join(" "));
    } catch {
      // Storage is refused: the choice holds until the page is left.
    }
  };
  return [shown, change];
}

function readShown<Row>(columns: readonly Column<Row>[], key: string | null): ReadonlySet<string> {
  const usual = columns.filter((column) => column.optional !== true).map((column) => column.id);
  try {
    const kept = key === null ? null : localStorage.getItem(key);
    const known = kept?.split(" ").filter((id) => columns.some((column) => column.id === id)) ?? [];
    return new Set(known.length > 0 ? known : usual);
  } catch {
    return new Set(usual);
  }
}
