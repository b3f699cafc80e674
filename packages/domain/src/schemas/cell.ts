import { z } from "zod";
import { id, instant, lengthMm, line, version } from "./quantities.ts";

export const SLOTS = ["wire", "gas", "flux"] as const;

/** Robot, power source and scanner, by name. */
export const Cell = z
  .object({
    id: id("Cell"),
    tag: z.string().meta({ description: "Tag", example: "C-8K3F7Q2N6" }),
    name: line("Name", "Cell 2"),
    robot: line("Robot", "Six-axis, 2.0 m, serial 7714"),
    power_source: line("Power source", "500 A pulsed, serial 0093"),
    scanner: line("Scanner", "Laser line 100 mm, serial 2208"),
    scanner_accuracy_mm: lengthMm("Scanner's stated accuracy (bound)", 0.03).nonnegative(),
    created_at: instant("When recorded"),
    version,
  })
  .meta({ id: "Cell" });
export type Cell = z.infer<typeof Cell>;

/** A new cell. */
export const CellCreate = z
  .strictObject(Cell.omit({ id: true, tag: true, created_at: true, version: true }).shape)
  .meta({ id: "CellCreate" });
export type CellCreate = z.infer<typeof CellCreate>;

/** A consumable lot that was on a cell's slot. */
export const Mount = z
  .object({
    id: id("Mount"),
    cell_id: id("Cell"),
    cell_name: z.string().meta({ description: "Cell's name" }),
    slot: z.enum(SLOTS).meta({ description: "Where on the cell" }),
    lot_tag: z.string().meta({ description: "Tag of the lot", example: "L-8K3F7Q2NN" }),
    lot_number: z.string().meta({ description: "Number of the lot", example: "W-3391" }),
    from_at: instant("Mounted"),
    to_at: instant("Taken off").nullable(),
  })
  .meta({ id: "Mount" });
export type Mount = z.infer<typeof Mount>;

/** Put a lot on a cell's slot; what was there is taken off at that moment. */
export const MountCreate = z
  .strictObject({
    cell_tag: z.string().optional().meta({ description: "Cell; a machine's key may leave it out" }),
    slot: z.enum(SLOTS).meta({ description: "Where on the cell", example: "wire" }),
    lot_tag: z.string().meta({ description: "Tag of the lot", example: "L-8K3F7Q2NN" }),
    at: instant("When it was mounted; now if absent").optional(),
  })
  .meta({ id: "MountCreate" });
export type MountCreate = z.infer<typeof MountCreate>;
