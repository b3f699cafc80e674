import { calendarUntil } from "./calendar.ts";
import type { DemoEvent, PlannedEvent } from "./demo-event.ts";
import { designEvents } from "./design/design-events.ts";
import { cellEvents } from "./production/cell-events.ts";
import { inspectionEvents } from "./production/inspection-events.ts";
import { partEvents } from "./production/part-events.ts";
import { schedule } from "./production/schedule.ts";
import { Random } from "./random.ts";
import { lotEvents } from "./shop/lots.ts";
import { peopleEvents } from "./shop/people.ts";

export interface DemoOptions {
  /** The same seed and end give the same events, byte for byte. */
  readonly seed: number;
  /** The scenario ends at this instant (RFC 3339), about now; it begins five weeks before. */
  readonly ends_at: string;
}

function plannedEvents({ seed, ends_at }: DemoOptions): PlannedEvent[] {
  const calendar = calendarUntil(ends_at);
  const tasks = schedule(new Random(seed, "schedule"));
  return [
    ...peopleEvents(calendar),
    ...lotEvents(calendar),
    ...designEvents(calendar),
    ...partEvents(calendar, tasks),
    ...cellEvents(seed, calendar, tasks),
    ...inspectionEvents(seed, calendar, tasks),
  ].toSorted((one, other) => one.at_ms - other.at_ms);
}

/**
 * The demo shop's record, event by event in order of time: people and procedures, drawings, lots with certificates,
 * parts with their pieces, and for each seam its scans, passes and inspections. Everything in it is invented.
 * Files are made when their event's turn comes.
 * @throws RangeError when `ends_at` is no instant
 */
export function* demoEvents(options: DemoOptions): Generator<DemoEvent> {
  for (const { make } of plannedEvents(options)) yield make();
}
