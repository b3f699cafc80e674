import type { ModelSeam } from "@beadroll/domain/schemas/drawing";
import type { ReactElement } from "react";
import { pathTo } from "../../app/paths.ts";
import { Button } from "../../kit/actions/button.tsx";
import type { Column } from "../../kit/tables/columns.ts";
import { DataTable } from "../../kit/tables/data-table.tsx";
import { LengthText } from "../../kit/units/length-text.tsx";
import { SCAN_RULE_WORDS } from "./drawing-words.ts";

const limitOf = (seam: ModelSeam): string =>
  `${seam.limits.within?.lateral_mm ?? "?"} / ${seam.limits.adapt?.lateral_mm ?? "?"}`;

const COLUMNS: readonly Column<ModelSeam>[] = [
  { id: "number", head: "Seam", value: (seam) => seam.number, figures: true, width: "4rem" },
  { id: "joint", head: "Joint", value: (seam) => seam.joint_type.replaceAll("_", " "), width: "7rem" },
  {
    id: "size",
    head: "Size",
    value: (seam) => seam.weld_size_mm,
    align: "right",
    figures: true,
    width: "4rem",
  },
  {
    id: "length",
    head: "Length",
    cell: (seam) => <LengthText length_mm={seam.length_mm} decimals={0} />,
    value: (seam) => seam.length_mm,
    align: "right",
    figures: true,
    width: "6rem",
    wideOnly: true,
  },
  { id: "level", head: "Level", value: (seam) => seam.quality_level, width: "4rem", wideOnly: true },
  { id: "limits", head: "Lateral, within / adapt", value: limitOf, figures: true, wideOnly: true },
  {
    id: "rule",
    head: "Scanned",
    value: (seam) => SCAN_RULE_WORDS[seam.scan_rule],
    width: "6rem",
    wideOnly: true,
  },
  { id: "procedure", head: "Procedure", value: (seam) => seam.procedure_name ?? "none", figures: true },
  {
    id: "seams",
    head: "Made",
    value: (seam) => seam.seam_count,
    align: "right",
    figures: true,
    width: "4rem",
  },
];

/** The model seams of a drawing in welding sequence. */
export function ModelSeamsTable(props: {
  drawingId: string;
  seams: readonly ModelSeam[];
  onEdit: ((seam: ModelSeam) => void) | null;
}): ReactElement {
  const { onEdit } = props;
  const edit: Column<ModelSeam> = {
    id: "edit",
    head: "Limits",
    cell: (seam) => (
      <Button
        kind="quiet"
        onClick={() => onEdit?.(seam)}
        aria-label={`Change the limits of seam ${seam.number}`}
      >
        Change
      </Button>
    ),
    width: "6rem",
  };
  return (
    <DataTable
      caption="Model seams"
      rows={props.seams}
      columns={onEdit === null ? COLUMNS : [...COLUMNS, edit]}
      rowKey={(seam) => seam.id}
      rowHref={(seam) => pathTo("modelSeam", { id: props.drawingId, number: seam.number })}
      fileName="model-seams"
      dense
      empty={
        <p className="px-[1.125rem] py-3 text-ash">
          No model seam yet. They come with their models through the API.
        </p>
      }
    />
  );
}
