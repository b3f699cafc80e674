import type { SeamRow } from "@beadroll/domain/schemas/seam";
import type { ReactElement } from "react";
import { pathTo } from "../../app/paths.ts";
import { StateMark } from "../../kit/states/state-mark.tsx";
import { BeadStrip } from "../../kit/strip/bead-strip.tsx";
import { stationsFromShares } from "../../kit/strip/strip-from-shares.ts";
import type { Column } from "../../kit/tables/columns.ts";
import { DataTable } from "../../kit/tables/data-table.tsx";
import { LengthText } from "../../kit/units/length-text.tsx";
import { formatFigure } from "../../kit/units/length-units.ts";
import { jointWords, seamNumber } from "../seams/seam-words.ts";

const COLUMNS: readonly Column<SeamRow>[] = [
  {
    id: "seam",
    head: "Seam",
    value: (seam) => seamNumber(seam.number, seam.attempt),
    figures: true,
    width: "4.5rem",
  },
  {
    id: "joint",
    head: "Joint",
    value: (seam) => jointWords(seam.joint_type, seam.weld_size_mm),
    width: "6.5rem",
    wideOnly: true,
  },
  {
    id: "strip",
    head: "Deviation along the seam, start to end",
    cell: (seam) =>
      seam.strip === null ? (
        <span className="text-sm text-ash">not scanned yet</span>
      ) : (
        <BeadStrip
          stations={stationsFromShares(seam.strip, seam.length_mm)}
          length_mm={seam.length_mm}
          label={`Seam ${seamNumber(seam.number, seam.attempt)}, share of the limit`}
          tabStop={false}
        />
      ),
  },
  {
    id: "largest",
    head: "Largest",
    field: "largest_mm",
    value: (seam) => seam.largest_mm,
    cell: (seam) => (seam.largest_mm === null ? "" : <LengthText length_mm={seam.largest_mm} decimals={2} />),
    align: "right",
    figures: true,
    width: "6rem",
    wideOnly: true,
  },
  {
    id: "heat_input",
    head: "kJ/mm",
    field: "heat_input_kj_mm",
    value: (seam) => seam.heat_input_kj_mm,
    cell: (seam) => (seam.heat_input_kj_mm === null ? "" : formatFigure(seam.heat_input_kj_mm, 2)),
    align: "right",
    figures: true,
    width: "4.5rem",
    wideOnly: true,
  },
  {
    id: "verdict",
    head: "Verdict",
    value: (seam) => seam.verdict,
    cell: (seam) => (seam.verdict === null ? "" : <StateMark state={seam.verdict} />),
    width: "6.5rem",
    wideOnly: true,
  },
  {
    id: "state",
    head: "State",
    value: (seam) => seam.state,
    cell: (seam) => <StateMark state={seam.state} />,
    width: "7.5rem",
  },
  { id: "tag", head: "Tag", value: (seam) => seam.tag, figures: true, optional: true, width: "9rem" },
];

/** The roll: a part as a list of bead strips. */
export function RollTable(props: {
  roll: readonly SeamRow[];
  fileName: string;
  changed: ReadonlySet<string>;
}): ReactElement {
  return (
    <DataTable
      caption="Seams of the part, in welding sequence"
      rows={props.roll}
      columns={COLUMNS}
      rowKey={(seam) => seam.id}
      rowHref={(seam) => pathTo("seam", { tag: seam.tag })}
      storeKey="roll"
      fileName={props.fileName}
      changed={props.changed}
    />
  );
}
