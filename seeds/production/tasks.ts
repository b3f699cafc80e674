import type { Ref } from "../demo-event.ts";
import type { SeamDesign } from "../design/product.ts";
import { procedureOf } from "../shop/procedures.ts";
import type { PassTrouble } from "../simulate/pass-log.ts";
import type { Misfit, PartPlan } from "./part-plan.ts";

interface OnSeam {
  readonly part: PartPlan;
  readonly seam: SeamDesign;
}

/** One scan of a seam: the first, or the one after it was fitted again. */
export interface ScanTask extends OnSeam {
  readonly kind: "scan";
  readonly again: boolean;
  /** Null where nothing special is known of the joint. */
  readonly misfit: Misfit | null;
}

/** The scan of a finished seam. */
export interface BeadTask extends OnSeam {
  readonly kind: "bead";
}

export interface PassTask extends OnSeam {
  readonly kind: "pass";
  readonly pass_number: number;
  readonly trouble: PassTrouble | null;
  /** The lot that goes on the wire slot while the arc waits. */
  readonly next_wire: Ref | null;
}

export interface MountTask {
  readonly kind: "mount";
  readonly slot: "wire" | "gas";
  readonly lot: Ref;
  /** Lot that is used up with this change. */
  readonly used_up: Ref | null;
}

/** The robot waits while a part is set up. */
export interface SetUpTask {
  readonly kind: "set-up";
  readonly part: PartPlan;
}

/** What a cell does, one thing after another. */
export type CellTask = ScanTask | PassTask | BeadTask | MountTask | SetUpTask;

/** What is mounted on a cell as its tasks go on; the planning functions write it. */
interface Mounted {
  wire: Ref | null;
  gas: Ref | null;
}

/** Consumables of a cell, by the part from which on they serve. */
interface Supply {
  readonly gas: Readonly<Record<Ref, Ref>>;
  /** For each process, by part; a spool change in the middle of a pass changes over without an entry here. */
  readonly wire: Readonly<Record<string, Readonly<Record<Ref, Ref>>>>;
}

/** The lot that goes on in the middle of a pass of frame 0416. */
const NEXT_WIRE = "lot-W-3402";

const SUPPLIES: Readonly<Record<Ref, Supply>> = {
  "cell-1": {
    gas: { "part-0410": "lot-G-118", "part-0415": "lot-G-121", "part-0422": "lot-G-124" },
    wire: { "135": { "part-0410": "lot-W-3391", "part-0417": NEXT_WIRE, "part-0421": "lot-W-3417" } },
  },
  "cell-2": {
    gas: { "part-0702": "lot-G-119", "part-0707": "lot-G-123" },
    wire: {
      "136": { "part-0702": "lot-F-0881" },
      "138": { "part-0702": "lot-M-2207", "part-0708": "lot-M-2214" },
    },
  },
};

/** The lot in use for a part: the one of the latest part named at or before it. */
function supplyFor(byPart: Readonly<Record<Ref, Ref>>, parts: readonly PartPlan[], part: PartPlan): Ref {
  const until = parts.slice(0, parts.indexOf(part) + 1).map(({ ref }) => ref);
  const found = until.map((ref) => byPart[ref]).findLast((lot) => lot !== undefined);
  if (found === undefined) throw new RangeError(`part: expected a supply for ${part.ref}`);
  return found;
}

/** Everything a cell does over the scenario, in order. */
export function cellTasks(cell: Ref, parts: readonly PartPlan[]): CellTask[] {
  const supply = SUPPLIES[cell];
  if (supply === undefined) throw new RangeError(`cell: expected one with supplies, got "${cell}"`);
  const mounted: Mounted = { wire: null, gas: null };
  return parts
    .filter(({ scanned }) => scanned > 0)
    .flatMap((part) => {
      const lots = (process: string) => supplyFor(supply.wire[process] ?? {}, parts, part);
      return [
        { kind: "set-up", part } satisfies SetUpTask,
        ...part.product.seams.slice(0, part.scanned).map((seam) => firstScan(part, seam)),
        ...changeOver(mounted, "gas", supplyFor(supply.gas, parts, part)),
        ...weldingTasks(part, mounted, lots),
      ];
    });
}

function firstScan(part: PartPlan, seam: SeamDesign): ScanTask {
  const misfit = part.held[seam.number] ?? part.refitted[seam.number] ?? null;
  return { kind: "scan", part, seam, again: false, misfit };
}

/** Seams that fit are welded first; those to be fitted again follow when the fitter is done. */
function weldingTasks(part: PartPlan, mounted: Mounted, lots: (process: string) => Ref): CellTask[] {
  const ready = part.product.seams
    .slice(0, part.welded)
    .filter(({ number }) => part.held[number] === undefined);
  const isRefitted = ({ number }: SeamDesign) => part.refitted[number] !== undefined;
  return [
    ...ready.filter((seam) => !isRefitted(seam)).flatMap((seam) => seamPasses(part, seam, mounted, lots)),
    ...ready
      .filter(isRefitted)
      .flatMap((seam) => [
        { kind: "scan", part, seam, again: true, misfit: null } satisfies ScanTask,
        ...seamPasses(part, seam, mounted, lots),
      ]),
  ];
}

function seamPasses(
  part: PartPlan,
  seam: SeamDesign,
  mounted: Mounted,
  lots: (process: string) => Ref,
): CellTask[] {
  const { process } = procedureOf(seam.procedure).fields;
  // After the spool change within a pass its lot stays on; only a new part may ask for another.
  const wanted = mounted.wire === NEXT_WIRE && lots(process) === "lot-W-3391" ? NEXT_WIRE : lots(process);
  const mounts = changeOver(mounted, "wire", wanted);
  const trouble = part.troubles[seam.number] ?? null;
  const changes = trouble?.kind === "spool-change";
  if (changes) mounted.wire = NEXT_WIRE;
  const passes = Array.from(
    { length: seam.passes },
    (_, i): PassTask => ({
      kind: "pass",
      part,
      seam,
      pass_number: i + 1,
      trouble: i === 0 ? trouble : null,
      next_wire: changes && i === 0 ? NEXT_WIRE : null,
    }),
  );
  const bead: BeadTask[] = isBeadScanned(part, seam) ? [{ kind: "bead", part, seam }] : [];
  return [...mounts, ...passes, ...bead];
}

/** Of every fourth part some finished fillets are scanned, and every fillet that an inspection was to reject. */
function isBeadScanned(part: PartPlan, { joint, number }: SeamDesign): boolean {
  if (joint !== "fillet_t") return false;
  const isSampled = part.place % 4 === 1 && Number(number.slice(1)) <= 6;
  return isSampled || part.rejected[number] !== undefined;
}

/** Lots of which the last has been used when they come off; flux-cored and metal-cored wire go on and off by turns. */
const USED_UP_WHEN_OFF = ["lot-W-3391", "lot-G-118", "lot-G-119", "lot-G-121"];

function changeOver(mounted: Mounted, slot: "wire" | "gas", lot: Ref): MountTask[] {
  const before = mounted[slot];
  if (before === lot) return [];
  mounted[slot] = lot;
  return [{ kind: "mount", slot, lot, used_up: before !== null && isUsedUp(before) ? before : null }];
}

function isUsedUp(lot: Ref): boolean {
  return USED_UP_WHEN_OFF.includes(lot);
}
