import type { LotPage } from "@beadroll/domain/schemas/lot";
import type { ReactElement } from "react";
import { PATHS, pathTo } from "../../app/paths.ts";
import type { Column } from "../../kit/tables/columns.ts";
import { DataTable } from "../../kit/tables/data-table.tsx";
import { InstantText } from "../../kit/units/instant-text.tsx";

type Use = LotPage["uses"][number];

const COLUMNS: readonly Column<Use>[] = [
  { id: "name", head: "Where", value: (use) => use.name },
  { id: "what", head: "As", value: (use) => use.what, width: "10rem" },
  {
    id: "from",
    head: "From",
    cell: (use) => <InstantText at={use.from_at} />,
    value: (use) => use.from_at,
    width: "10rem",
  },
  {
    id: "to",
    head: "Until",
    cell: (use) => (use.to_at === null ? "now" : <InstantText at={use.to_at} />),
    value: (use) => use.to_at,
    width: "10rem",
    wideOnly: true,
  },
];

/** Where a lot went: pieces of parts, and stays on cells. */
export function LotUses(props: { lot: LotPage }): ReactElement {
  return (
    <DataTable
      caption="Where this lot went"
      rows={props.lot.uses}
      columns={COLUMNS}
      rowKey={(use) => `${use.tag} ${use.what} ${use.from_at}`}
      rowHref={(use) => (use.kind === "piece" ? pathTo("part", { tag: use.tag }) : PATHS.floor.path)}
      fileName={`uses-of-${props.lot.number}`}
      dense
      empty={<p className="px-[1.125rem] py-3 text-ash">It has not been used yet.</p>}
    />
  );
}
