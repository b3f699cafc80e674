import { type Calendar, instantOf, WORKING_HOURS } from "../calendar.ts";
import type { PlannedEvent, Ref } from "../demo-event.ts";
import { piecesOf } from "./material.ts";
import { PARTS, type PartPlan } from "./part-plan.ts";
import type { TimedTask } from "./schedule.ts";

const PLANNING = "y.demir";
const COORDINATOR = "h.oyelaran";

/** Planning starts a part this long before a cell sets it up. */
const STARTED_BEFORE_HOURS = 12;
/** Pieces are built in at the fitting bench this long before. */
const FITTED_BEFORE_HOURS = 0.9;
const BETWEEN_PIECES_HOURS = 0.04;
/** Parts that no cell has begun were started this long before the end. */
const WAITING_HOURS = 6;

/** The working hour at which planning starts each part; a part follows the one it is built into. */
function startHours(setUpHours: ReadonlyMap<Ref, number>): Map<Ref, number> {
  const hours = new Map<Ref, number>();
  for (const [i, part] of PARTS.entries()) {
    const setUp = setUpHours.get(part.ref) ?? WORKING_HOURS + STARTED_BEFORE_HOURS - WAITING_HOURS;
    const parent = part.parent === null ? 0 : (hours.get(part.parent) ?? 0);
    hours.set(part.ref, Math.max(0.1 + 0.002 * i, setUp - STARTED_BEFORE_HOURS, parent + 0.01));
  }
  return hours;
}

/** Parts are started and their pieces built in. */
export function partEvents(calendar: Calendar, tasks: readonly TimedTask[]): PlannedEvent[] {
  const setUpHours = new Map(
    tasks.flatMap(({ task, hour }) => (task.kind === "set-up" ? [[task.part.ref, hour] as const] : [])),
  );
  const started = startHours(setUpHours);
  return PARTS.flatMap((part) => {
    const hour = started.get(part.ref) ?? 0;
    const setUp = setUpHours.get(part.ref);
    const pieces = setUp === undefined ? [] : pieceEvents(part, setUp - FITTED_BEFORE_HOURS, calendar);
    return [startEvent(part, calendar.at(hour)), ...pieces];
  });
}

function startEvent(part: PartPlan, at_ms: number): PlannedEvent {
  const { ref, serial, order_no, parent, product } = part;
  return {
    at_ms,
    make: () => ({
      kind: "part",
      at: instantOf(at_ms),
      by: PLANNING,
      ref,
      drawing: product.ref,
      parent,
      fields: { serial, order_no },
    }),
  };
}

function pieceEvents(part: PartPlan, hour: number, calendar: Calendar): PlannedEvent[] {
  return piecesOf(part).map(({ position, lot }, i) => {
    const at_ms = calendar.at(hour + i * BETWEEN_PIECES_HOURS);
    return {
      at_ms,
      make: () => ({
        kind: "piece",
        at: instantOf(at_ms),
        by: COORDINATOR,
        part: part.ref,
        lot,
        fields: { position },
      }),
    };
  });
}
