import { describe, expect, it } from "vitest";
import { changedKeys } from "./changed-keys.ts";
import { cellSpecimen, floorSpecimen, mountSpecimen, seamSpecimen } from "./floor-specimen.ts";
import { countKey, floorValues, HELD_COUNT, mountKey } from "./floor-values.ts";

const before = floorSpecimen();
const { cell } = cellSpecimen();

const changedIn = (some: Parameters<typeof cellSpecimen>[0]) =>
  [...changedKeys(floorValues(before), floorValues(floorSpecimen({ cells: [cellSpecimen(some)] })))].sort();

describe("what is marked on the floor", () => {
  it("is nothing while only the time of the last record moves", () =>
    expect(changedIn({ last_event_at: "2026-12-01T11:59:00.000Z" })).toEqual([]));

  it("is a count, a seam and a mount of their own", () => {
    expect(changedIn({ today: { scans: 3, passes: 1, holds: 1 } })).toEqual(
      [countKey(cell, "holds"), countKey(cell, "scans")].sort(),
    );
    const seam = { ...seamSpecimen("welded"), changed_at: "2026-12-01T12:00:05.000Z" };
    expect(changedIn({ latest: [seam, seamSpecimen("clear")] })).toEqual([seam.id]);
    const wire = { ...mountSpecimen("wire"), id: "another spool" };
    expect(changedIn({ mounts: [wire, mountSpecimen("gas")] })).toEqual([mountKey(wire)]);
  });

  it("is a seam that begins to wait, and the count of those that do", () => {
    const held = seamSpecimen("held");
    const after = floorValues(floorSpecimen({ held: [held], held_count: 1 }));
    expect([...changedKeys(floorValues(before), after)].sort()).toEqual([HELD_COUNT, held.id].sort());
  });
});
