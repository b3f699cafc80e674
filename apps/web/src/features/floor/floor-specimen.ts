import type { Floor, FloorCell } from "@beadroll/domain/schemas/floor";
import type { SeamRow } from "@beadroll/domain/schemas/seam";

/** The moment at which the specimens stand. */
export const NOON = "2026-12-01T12:00:00.000Z";

/** A mounted lot, for tests. */
export const mountSpecimen = (slot: "wire" | "gas" | "flux"): FloorCell["mounts"][number] => ({
  id: `m-${slot}`,
  cell_id: "c",
  cell_name: "Cell 1",
  slot,
  lot_tag: "L-8K3F7Q2NN",
  lot_number: "W-3391",
  from_at: NOON,
  to_at: null,
});

/** A seam in some state, for tests. */
export const seamSpecimen = (state: SeamRow["state"]): SeamRow => ({
  id: `s-${state}`,
  tag: "S-8K3F7Q2NS",
  number: "S4",
  attempt: 1,
  joint_type: "fillet_t",
  weld_size_mm: 5,
  length_mm: 320,
  state,
  verdict: null,
  largest_mm: null,
  heat_input_kj_mm: null,
  strip: null,
  part_tag: "P-8K3F7Q2NA",
  part_name: "Skid frame 0418",
  changed_at: NOON,
});

/** A cell at work with everything mounted, but for what is said otherwise; for tests. */
export const cellSpecimen = (some: Partial<FloorCell> = {}): FloorCell => ({
  cell: {
    id: "c",
    tag: "C-8K3F7Q2N6",
    name: "Cell 1",
    robot: "Six-axis",
    power_source: "500 A",
    scanner: "Laser line",
    scanner_accuracy_mm: 0.03,
    created_at: NOON,
    version: 1,
  },
  mounts: [mountSpecimen("wire"), mountSpecimen("gas")],
  last_event_at: "2026-12-01T11:55:00.000Z",
  latest: [seamSpecimen("clear"), seamSpecimen("welded")],
  today: { scans: 2, passes: 1, holds: 0 },
  ...some,
});

/** A floor of one cell, for tests. */
export const floorSpecimen = (some: Partial<Floor> = {}): Floor => ({
  cells: [cellSpecimen()],
  held: [],
  held_count: 0,
  to_inspect: [],
  to_inspect_count: 0,
  ...some,
});
