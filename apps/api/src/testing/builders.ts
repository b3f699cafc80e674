import type { Cell } from "@beadroll/domain/schemas/cell";
import type { DrawingPage } from "@beadroll/domain/schemas/drawing";
import type { Lot, LotCreate } from "@beadroll/domain/schemas/lot";
import type { PartPage } from "@beadroll/domain/schemas/part";
import type { Procedure } from "@beadroll/domain/schemas/procedure";
import type { SeamModel } from "@beadroll/domain/schemas/seam-model";
import { createCell } from "../cells/cells.service.ts";
import { readDrawingPage } from "../drawings/drawings.read.ts";
import { createDrawing, createModelSeam } from "../drawings/drawings.service.ts";
import { createLot, patchLot } from "../lots/lots.service.ts";
import { createPart } from "../parts/parts.service.ts";
import { createProcedure, patchProcedure } from "../procedures/procedures.service.ts";
import type { TestServer } from "./test-server.ts";

let counter = 0;
const next = (): string => {
  counter += 1;
  return String(counter).padStart(4, "0");
};

/** A straight T joint of 40 mm along x, its root at y = 100, upright to +y. */
export function aModel(length_mm = 40): SeamModel {
  const vertices = [];
  for (let station_mm = 0; station_mm <= length_mm; station_mm += 2)
    vertices.push({
      station_mm,
      point: [station_mm, 100, 0] as [number, number, number],
      tangent: [1, 0, 0] as [number, number, number],
      lateral: [0, 1, 0] as [number, number, number],
      normal: [0, 0, 1] as [number, number, number],
    });
  return {
    case: "test-t-joint",
    joint_type: "fillet_t",
    seam: { length_mm, closed: false, vertices },
    section: {
      plate_a: { thickness_mm: 12 },
      plate_b: { thickness_mm: 6, height_mm: 20 },
      gap_mm: 0,
      included_angle_deg: 90,
    },
  };
}

/**
 * A clean scan of that joint as profiles in the part frame (XYZ): both faces, displaced as asked.
 * @param lateral_mm how far the upright stands toward +y
 */
export function aScan(lateral_mm = 0, length_mm = 40): Buffer {
  const lines: string[] = ["x_mm,y_mm,z_mm"];
  for (let x = 0; x <= length_mm; x += 1) {
    for (let d = 0.4; d <= 16; d += 0.2) {
      const wave = 0.01 * Math.sin(12.9898 * d + 78.233 * x);
      lines.push(`${x},${(100 + lateral_mm - d).toFixed(4)},${wave.toFixed(4)}`);
      lines.push(`${x},${(100 + lateral_mm + wave).toFixed(4)},${d.toFixed(4)}`);
    }
  }
  return Buffer.from(`${lines.join("\n")}\n`);
}

/** A clean scan of the same joint once welded: a flat fillet with legs of 7.2 mm, with an undercut if asked for. */
export function aBeadScan(undercut_mm = 0, length_mm = 40): Buffer {
  const leg_mm = 7.2;
  const lines: string[] = ["x_mm,y_mm,z_mm"];
  for (let x = 0; x <= length_mm; x += 1) {
    const put = (y: number, z: number) => lines.push(`${x},${(100 + y).toFixed(4)},${z.toFixed(4)}`);
    for (let d = leg_mm; d <= 19; d += 0.1) {
      const dip = d < leg_mm + 1.6 ? (undercut_mm * (1 - Math.cos((Math.PI * (d - leg_mm)) / 0.8))) / 2 : 0;
      put(-d, 0);
      put(dip, d);
    }
    for (let share = 0; share <= 1; share += 0.01) put(-leg_mm * (1 - share), leg_mm * share);
  }
  return Buffer.from(`${lines.join("\n")}\n`);
}

/** A log of one steady pass. */
export function aLog(arc_s = 6, current_a = 250): Buffer {
  const lines = ["time_s,current_a,voltage_v,wire_feed_m_min,travel_mm_s,gas_l_min"];
  for (let i = 0; i <= (arc_s + 2) * 10; i += 1) {
    const t = i / 10;
    const burns = t >= 1 && t <= arc_s + 1;
    lines.push(burns ? `${t},${current_a},28,8.2,6.5,17` : `${t},0,0,0,0,17`);
  }
  return Buffer.from(`${lines.join("\n")}\n`);
}

/** An approved procedure. */
export async function aProcedure({ context }: TestServer): Promise<Procedure> {
  const procedure = await createProcedure(context, {
    number: `PB-135-${next()}`,
    revision: "1",
    title: "Fillet a5",
    process: "135",
    position: "PB",
    ranges: {
      current_a: { min: 220, max: 280 },
      voltage_v: { min: 26, max: 30 },
      wire_feed_m_min: null,
      travel_mm_s: { min: 5, max: 8 },
      gas_l_min: { min: 15, max: 20 },
      heat_input_kj_mm: { min: 0.6, max: 1.4 },
      interpass_c: null,
    },
  });
  return patchProcedure(context, procedure.id, { status: "approved" }, procedure.version);
}

/** A current drawing with seams S1 … Sn to one procedure. */
export async function aDrawing(server: TestServer, seams = 2): Promise<DrawingPage> {
  const { context, deps } = server;
  const drawing = await createDrawing(context, {
    number: `FW-${next()}`,
    revision: "A",
    title: "Test frame",
    status: "current",
  });
  const procedure = await aProcedure(server);
  for (let i = 1; i <= seams; i += 1)
    await createModelSeam(context, drawing.id, {
      number: `S${i}`,
      sequence: i,
      weld_size_mm: 5,
      quality_level: "C",
      procedure_id: procedure.id,
      scan_rule: "always",
      model: aModel(),
    });
  return readDrawingPage(deps.db.reader, drawing.id);
}

/** A part to a new drawing. */
export async function aPart(server: TestServer, seams = 2): Promise<PartPage> {
  const drawing = await aDrawing(server, seams);
  return createPart(server.context, { drawing_id: drawing.id, serial: next(), order_no: "41-2207" });
}

/** A released lot. */
export async function aLot({ context }: TestServer, fields: Partial<LotCreate> = {}): Promise<Lot> {
  const lot = await createLot(context, {
    kind: "plate",
    number: `H${next()}`,
    supplier: "Nordhall Steel",
    grade: "S355J2",
    quantity: 4,
    unit: "pcs",
    received_on: "2026-11-02",
    ...fields,
  });
  return patchLot(context, lot.tag, { state: "released" }, lot.version);
}

/** A cell. */
export function aCell({ context }: TestServer): Promise<Cell> {
  return createCell(context, {
    name: `Cell ${next()}`,
    robot: "Six-axis, 2.0 m",
    power_source: "500 A pulsed",
    scanner: "Laser line 100 mm",
    scanner_accuracy_mm: 0.03,
  });
}
