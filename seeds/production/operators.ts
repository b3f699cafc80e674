import { SHIFT_HOURS } from "../calendar.ts";
import type { Ref } from "../demo-event.ts";
import { LAPSE_HOUR } from "../shop/people.ts";
import type { TimedTask } from "./schedule.ts";

export interface Operator {
  readonly person: Ref;
  readonly login: string;
}

const VARGA: Operator = { person: "person-varga", login: "i.varga" };
const CASTELL: Operator = { person: "person-castell", login: "d.castell" };
const HALVORSEN: Operator = { person: "person-halvorsen", login: "n.halvorsen" };

/** Passes that the third operator still welded after the qualification had lapsed, until somebody noticed. */
const UNNOTICED_PASSES = 2;

/** The roster: the first two change cells from day to day, the third has the first cell every other day. */
function onRoster(cell: Ref, hour: number): Operator {
  const even = Math.floor(hour / SHIFT_HOURS) % 2 === 0;
  if (cell === "cell-2") return even ? CASTELL : VARGA;
  return even ? VARGA : HALVORSEN;
}

/** Who stands at the cell for each task; tasks come in order of time for each cell. */
export function operatorsOf(tasks: readonly TimedTask[]): ReadonlyMap<TimedTask, Operator> {
  let unnoticed = 0;
  const operators = new Map<TimedTask, Operator>();
  for (const timed of tasks) {
    const rostered = onRoster(timed.cell, timed.hour);
    const lapsed = rostered === HALVORSEN && timed.hour > LAPSE_HOUR + 1;
    operators.set(timed, lapsed && unnoticed >= UNNOTICED_PASSES ? CASTELL : rostered);
    if (lapsed && timed.task.kind === "pass") unnoticed++;
  }
  return operators;
}
