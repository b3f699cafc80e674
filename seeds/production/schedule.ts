import { WORKING_HOURS } from "../calendar.ts";
import type { Ref } from "../demo-event.ts";
import type { Random } from "../random.ts";
import { CELL_PARTS, type PartPlan } from "./part-plan.ts";
import { type CellTask, cellTasks } from "./tasks.ts";

/** A task and the working hour at which it begins. */
export interface TimedTask {
  readonly cell: Ref;
  readonly hour: number;
  readonly task: CellTask;
}

/** Cells begin this long after the program was set up. */
const FIRST_HOUR = 1.2;
/** The last task begins this long before the scenario ends, so that its result is in by then. */
const LAST_TASK_BEFORE_END_HOURS = 0.12;

/** How long tasks take, as shares of one pass with its preparation. */
const EFFORT: Readonly<Record<CellTask["kind"], number>> = {
  "set-up": 2,
  scan: 0.4,
  mount: 0.3,
  pass: 1,
  bead: 0.3,
};

function timedTasks(cell: Ref, parts: readonly PartPlan[], random: Random): TimedTask[] {
  const tasks = cellTasks(cell, parts);
  const efforts = tasks.map(({ kind }) => EFFORT[kind] * random.between(0.8, 1.2));
  const total = efforts.slice(0, -1).reduce((sum, effort) => sum + effort, 0);
  const hoursEach = (WORKING_HOURS - FIRST_HOUR - LAST_TASK_BEFORE_END_HOURS) / total;
  let hour = FIRST_HOUR;
  return tasks.map((task, i) => {
    const begins = hour;
    hour += (efforts[i] ?? 0) * hoursEach;
    return { cell, hour: begins, task };
  });
}

/** What both cells do, cell by cell, each in order of time; the last task of each ends shortly before the scenario. */
export function schedule(random: Random): TimedTask[] {
  return CELL_PARTS.flatMap(({ cell, parts }) => timedTasks(cell, parts, random));
}
