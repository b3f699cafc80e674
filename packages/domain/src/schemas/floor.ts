import { z } from "zod";
import { Cell, Mount } from "./cell.ts";
import { instant } from "./quantities.ts";
import { SeamRow } from "./seam.ts";

/** A cell as the floor shows it. */
export const FloorCell = z
  .object({
    cell: Cell,
    mounts: z.array(Mount).meta({ description: "What is mounted now" }),
    last_event_at: instant("Last scan or pass it sent").nullable(),
    latest: z.array(SeamRow).meta({ description: "The seams it worked on last, 6 at most" }),
    today: z
      .object({
        scans: z.int().meta({ description: "Scans recorded", example: 18 }),
        passes: z.int().meta({ description: "Passes welded", example: 16 }),
        holds: z.int().meta({ description: "Scans with the verdict hold", example: 1 }),
      })
      .meta({ description: "Scans, passes and holds since midnight UTC" }),
  })
  .meta({ id: "FloorCell" });
export type FloorCell = z.infer<typeof FloorCell>;

/** The floor: every cell, and the seams that wait for somebody's decision. */
export const Floor = z
  .object({
    cells: z.array(FloorCell).meta({ description: "Cells by name" }),
    held: z.array(SeamRow).meta({ description: "Seams held, oldest first, 50 at most" }),
    held_count: z.int().meta({ description: "All seams held", example: 9 }),
    to_inspect: z
      .array(SeamRow)
      .meta({ description: "Welded seams not inspected, oldest first, 50 at most" }),
    to_inspect_count: z.int().meta({ description: "All welded seams not inspected", example: 31 }),
  })
  .meta({ id: "Floor" });
export type Floor = z.infer<typeof Floor>;
