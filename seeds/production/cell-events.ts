import { type Calendar, instantOf } from "../calendar.ts";
import { DEMO_KEYS } from "../demo-accounts.ts";
import type { DemoEvent, PlannedEvent, Ref, SeamRef } from "../demo-event.ts";
import { Random } from "../random.ts";
import { lotDecision } from "../shop/lots.ts";
import { procedureOf } from "../shop/procedures.ts";
import { longestWait, type PassPlan, passDuration, passLogCsv } from "../simulate/pass-log.ts";
import { scanSeam } from "../simulate/scan-seam.ts";
import { commonFit, type Fit, fitUpFor, partPose } from "./fit-ups.ts";
import { type Operator, operatorsOf } from "./operators.ts";
import { type Misfit, PARTS } from "./part-plan.ts";
import type { TimedTask } from "./schedule.ts";
import type { BeadTask, CellTask, MountTask, PassTask, ScanTask } from "./tasks.ts";
import { weldFor } from "./welds.ts";

/** What every event of a cell needs to know. */
interface Floor {
  readonly seed: number;
  readonly calendar: Calendar;
  readonly cell: Ref;
  readonly hour: number;
  readonly operator: Operator;
}

/** From the scanner's last profile to the record, s. */
const SCAN_SENT_S = 9;
/** From the end of a log to its record, s. */
const PASS_SENT_S = 4;
const USED_UP_AFTER_S = 900;

/** What the cells send: scans, passes and what is mounted. */
export function cellEvents(seed: number, calendar: Calendar, tasks: readonly TimedTask[]): PlannedEvent[] {
  const operators = operatorsOf(tasks);
  return tasks.flatMap((timed) => {
    const operator = operators.get(timed);
    if (operator === undefined) throw new RangeError(`tasks: expected an operator at hour ${timed.hour}`);
    return taskEvents(timed.task, { seed, calendar, cell: timed.cell, hour: timed.hour, operator });
  });
}

function taskEvents(task: CellTask, floor: Floor): PlannedEvent[] {
  switch (task.kind) {
    case "set-up":
      return [];
    case "scan":
      return [scanEvent(task, floor)];
    case "pass":
      return passEvents(task, floor);
    case "bead":
      return [beadEvent(task, floor)];
    case "mount":
      return mountEvents(task, floor);
  }
}

function keyNameOf(cell: Ref): string {
  const key = DEMO_KEYS.find((each) => each.cell === cell);
  if (key === undefined) throw new RangeError(`cell: expected one with a key, got "${cell}"`);
  return key.name;
}

/** The random stream of a scan; its first draw, where nothing is told about the joint, is how the joint stands. */
function scanRandom(seed: number, seam: SeamRef, again: boolean): Random {
  return new Random(seed, `scan ${seam.part} ${seam.number} ${again ? "again" : "first"}`);
}

function fitOf(misfit: Misfit | null, random: Random): Fit {
  return misfit ?? commonFit(random);
}

/** How a joint was made to stand for a scan, for those who check the scenario. */
export function intendedFit(seed: number, seam: SeamRef, again: boolean): Fit {
  const part = PARTS.find(({ ref }) => ref === seam.part);
  const misfit = again ? undefined : (part?.held[seam.number] ?? part?.refitted[seam.number]);
  return fitOf(misfit ?? null, scanRandom(seed, seam, again));
}

function scanEvent(task: ScanTask, { seed, calendar, cell, hour }: Floor): PlannedEvent {
  const { part, seam, again, misfit } = task;
  const taken_ms = calendar.at(hour);
  const at_ms = taken_ms + SCAN_SENT_S * 1000;
  const on: SeamRef = { part: part.ref, number: seam.number };
  const make = (): DemoEvent => {
    const random = scanRandom(seed, on, again);
    const fitUp = fitUpFor(seam, fitOf(misfit, random), random);
    const pose = partPose(new Random(seed, `pose ${part.ref}`));
    const name = `${part.serial}-${seam.number}-fitup-${again ? 2 : 1}.ply`;
    return {
      kind: "scan",
      at: instantOf(at_ms),
      by: keyNameOf(cell),
      seam: on,
      cell,
      fields: { stage: "fitup", units: "mm", taken_at: instantOf(taken_ms) },
      file: { name, bytes: scanSeam({ seam, fitUp, pose }, random) },
    };
  };
  return { at_ms, make };
}

/** The finished weld on the joint as it stood for its last scan. */
function beadEvent({ part, seam }: BeadTask, { seed, calendar, cell, hour }: Floor): PlannedEvent {
  const taken_ms = calendar.at(hour);
  const at_ms = taken_ms + SCAN_SENT_S * 1000;
  const on: SeamRef = { part: part.ref, number: seam.number };
  const make = (): DemoEvent => {
    const random = scanRandom(seed, on, part.refitted[seam.number] !== undefined);
    const fitUp = fitUpFor(seam, fitOf(null, random), random);
    const weld = weldFor(part.ref, seam, new Random(seed, `weld ${part.ref} ${seam.number}`));
    const pose = partPose(new Random(seed, `pose ${part.ref}`));
    return {
      kind: "scan",
      at: instantOf(at_ms),
      by: keyNameOf(cell),
      seam: on,
      cell,
      fields: { stage: "bead", units: "mm", taken_at: instantOf(taken_ms) },
      file: {
        name: `${part.serial}-${seam.number}-bead.ply`,
        bytes: scanSeam({ seam, fitUp: { ...fitUp, tacks: [], blind: [] }, pose, weld }, random),
      },
    };
  };
  return { at_ms, make };
}

function passPlan({ seam, trouble }: PassTask): PassPlan {
  return { settings: procedureOf(seam.procedure).settings, length_mm: seam.line.length_mm, trouble };
}

function passEvents(task: PassTask, floor: Floor): PlannedEvent[] {
  const { part, seam, pass_number } = task;
  const { seed, calendar, cell, hour, operator } = floor;
  const plan = passPlan(task);
  const started_ms = calendar.at(hour);
  const at_ms = started_ms + Math.round(passDuration(plan) + PASS_SENT_S) * 1000;
  const make = (): DemoEvent => ({
    kind: "pass",
    at: instantOf(at_ms),
    by: keyNameOf(cell),
    seam: { part: part.ref, number: seam.number },
    cell,
    operator: operator.person,
    fields: {
      pass_number,
      started_at: instantOf(started_ms),
      program: `${part.product.program}-${seam.number} v${programVersion(part.place)}`,
    },
    file: {
      name: `${part.serial}-${seam.number}-pass-${pass_number}.csv`,
      bytes: passLogCsv(plan, new Random(seed, `pass ${part.ref} ${seam.number} ${pass_number}`)),
    },
  });
  return [...spoolChange(task, plan, floor), { at_ms, make }];
}

/** Programs are touched up now and then. */
function programVersion(place: number): number {
  return 10 + Math.floor(place / 4);
}

/** The next spool goes on while the arc waits in the middle of the pass. */
function spoolChange(task: PassTask, plan: PassPlan, floor: Floor): PlannedEvent[] {
  const wait_s = longestWait(plan);
  if (task.next_wire === null || wait_s === null) return [];
  const at_ms = floor.calendar.at(floor.hour) + Math.round(wait_s) * 1000;
  return mountsAt({ kind: "mount", slot: "wire", lot: task.next_wire, used_up: "lot-W-3391" }, at_ms, floor);
}

function mountEvents(task: MountTask, floor: Floor): PlannedEvent[] {
  return mountsAt(task, floor.calendar.at(floor.hour), floor);
}

function mountsAt(task: MountTask, at_ms: number, { cell, operator }: Floor): PlannedEvent[] {
  const { slot, lot, used_up } = task;
  const mount: PlannedEvent = {
    at_ms,
    make: () => ({
      kind: "mount",
      at: instantOf(at_ms),
      by: operator.login,
      cell,
      lot,
      fields: { slot, at: instantOf(at_ms) },
    }),
  };
  if (used_up === null) return [mount];
  return [mount, lotDecision(used_up, at_ms + USED_UP_AFTER_S * 1000, { state: "used_up" })];
}
