import type { InspectionCreate } from "@beadroll/domain/schemas/inspection";
import { type Calendar, instantOf, WORKING_HOURS } from "../calendar.ts";
import type { PlannedEvent } from "../demo-event.ts";
import type { SeamDesign } from "../design/product.ts";
import { Random } from "../random.ts";
import { PARTS, type PartPlan } from "./part-plan.ts";
import type { TimedTask } from "./schedule.ts";

const INSPECTORS = ["m.solheim", "a.duarte"] as const;

/** Visual inspection begins this long after a part's last pass. */
const VISUAL_AFTER_HOURS = [4, 9] as const;
const VISUAL_EACH_HOURS = 0.09;
/** Further methods follow the visual inspection, on the next shift at the earliest. */
const FURTHER_AFTER_HOURS = 9;
/** The last inspection is recorded this long before the scenario ends. */
const BEFORE_END_HOURS = 0.2;
/** From the look at the seam to its record, s. */
const WRITTEN_S = 80;

const REMARKS = [
  "",
  "",
  "",
  "Even toes, no undercut above 0.3 mm.",
  "Ripples even, crater filled.",
  "Leg lengths within 0.6 mm of each other.",
  "Light spatter, brushed off.",
  "Intermittent undercut 0.3 mm, short, inside the level.",
] as const;

/** What is examined beside visually: lugs by magnetic particles, butts by ultrasound. */
function furtherMethod(seam: SeamDesign): { method: InspectionCreate["method"]; note: string } | null {
  if (seam.joint === "butt_v")
    return { method: "UT", note: "45 and 60 degree probes, no recordable indication." };
  if (seam.quality_level === "B") return { method: "MT", note: "Yoke, both directions, no indication." };
  return null;
}

/** A rejection that names a fault inside the metal was found by the further method. */
const isInside = (finding: string): boolean => finding.startsWith("Lack of");

function lastPassHours(tasks: readonly TimedTask[]): Map<PartPlan, number> {
  const hours = new Map<PartPlan, number>();
  for (const { task, hour } of tasks) if (task.kind === "pass") hours.set(task.part, hour);
  return hours;
}

/** Inspections of the parts that were welded, each part by one inspector in one go. */
export function inspectionEvents(
  seed: number,
  calendar: Calendar,
  tasks: readonly TimedTask[],
): PlannedEvent[] {
  const welded = lastPassHours(tasks);
  return PARTS.flatMap((part, i) => {
    const lastPass = welded.get(part);
    if (lastPass === undefined) return [];
    const random = new Random(seed, `inspection ${part.ref}`);
    const seams = part.product.seams.slice(0, part.inspected).filter(({ number }) => !(number in part.held));
    const latest = WORKING_HOURS - BEFORE_END_HOURS - seams.length * VISUAL_EACH_HOURS;
    const soon = Math.min(lastPass + random.between(...VISUAL_AFTER_HOURS), latest);
    // A part that is inspected in part is the one under the inspector's eyes when the scenario ends.
    const first = part.inspected < part.welded ? latest : soon;
    const by = INSPECTORS[i % INSPECTORS.length] ?? INSPECTORS[0];
    return seams.flatMap((seam, place) => {
      const hour = first + place * VISUAL_EACH_HOURS;
      return inspectionsOf({ part, seam, by, hour }, calendar, random);
    });
  });
}

interface Examination {
  readonly part: PartPlan;
  readonly seam: SeamDesign;
  readonly by: string;
  readonly hour: number;
}

function inspectionsOf(examination: Examination, calendar: Calendar, random: Random): PlannedEvent[] {
  const { part, seam, hour } = examination;
  const finding = part.rejected[seam.number];
  const further = furtherMethod(seam);
  const remark = random.pick(REMARKS);
  const visual =
    finding !== undefined && !isInside(finding)
      ? recorded(examination, { method: "VT", result: "rejected", note: finding }, calendar)
      : recorded(examination, { method: "VT", result: "accepted", note: remark }, calendar);
  const furtherHour = hour + FURTHER_AFTER_HOURS;
  if (further === null || furtherHour > WORKING_HOURS - BEFORE_END_HOURS) return [visual];
  const rejected = finding !== undefined && isInside(finding);
  const fields: InspectionCreate = rejected
    ? { method: further.method, result: "rejected", note: finding }
    : { ...further, result: "accepted" };
  return [visual, recorded({ ...examination, hour: furtherHour }, fields, calendar)];
}

function recorded(
  { part, seam, by, hour }: Examination,
  fields: InspectionCreate,
  calendar: Calendar,
): PlannedEvent {
  const at_ms = calendar.at(hour);
  return {
    at_ms,
    make: () => ({
      kind: "inspection",
      at: instantOf(at_ms),
      by,
      seam: { part: part.ref, number: seam.number },
      fields: { ...fields, performed_at: instantOf(at_ms - WRITTEN_S * 1000) },
    }),
  };
}
