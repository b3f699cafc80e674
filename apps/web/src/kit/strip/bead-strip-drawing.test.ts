import { describe, expect, it } from "vitest";
import {
  drawStrip,
  type RippleCommand,
  ripplePath,
  stationAt,
  stationAtX,
  stripFrame,
  xOfStation,
} from "./bead-strip-drawing.ts";
import type { StripStation } from "./strip-groups.ts";

const PLACE = { width: 424, height: 32 };

/** Stations every 5 mm; a share with its sign, null where not measured. */
function seam(...shares: readonly (number | null)[]): StripStation[] {
  return shares.map((share, index) =>
    share === null
      ? { station_mm: index * 5, measured: false }
      : { station_mm: index * 5, measured: true, share: Math.abs(share), deviation: share * 3 },
  );
}

const ripplesOf = (stations: StripStation[], place = PLACE): RippleCommand[] =>
  drawStrip(stations, place).filter((command) => command.kind === "ripple");

describe("a strip", () => {
  it("has one ripple a station where there is room, painted from the end so that each lies over the next", () => {
    const ripples = ripplesOf(seam(0.1, 0.2, 0.3, 0.4));
    expect(ripples.map((ripple) => ripple.station)).toEqual([3, 2, 1, 0]);
    expect(ripples.map((ripple) => ripple.x)).toEqual(
      [...ripples.map((ripple) => ripple.x)].sort((a, b) => b - a),
    );
  });

  it("shifts a ripple up for a positive deviation and down for a negative one, by its share of the limit", () => {
    const [none, up, down, half] = ripplesOf(seam(0, 1, -1, 0.5)).reverse();
    const middle = PLACE.height / 2;
    expect(none?.y).toBe(middle);
    expect(up?.y).toBeLessThan(middle);
    expect((down?.y ?? 0) - middle).toBeCloseTo(middle - (up?.y ?? 0), 9);
    expect(middle - (half?.y ?? 0)).toBeCloseTo((middle - (up?.y ?? 0)) / 2, 9);
  });

  it("keeps every ripple inside its place, however far beyond the limit a station is", () => {
    for (const share of [-40, -1.2, 0, 1, 3, 1000]) {
      for (const height of [12, 32, 84]) {
        for (const ripple of ripplesOf(seam(share, share, share), { width: 200, height })) {
          expect(ripple.y - ripple.ry).toBeGreaterThanOrEqual(0);
          expect(ripple.y + ripple.ry).toBeLessThanOrEqual(height);
          expect(ripple.x).toBeGreaterThanOrEqual(0);
          expect(ripple.x + ripple.width + ripple.rx).toBeLessThanOrEqual(200);
        }
      }
    }
  });

  it("draws a stretch without data as one gap and never as a ripple", () => {
    const commands = drawStrip(seam(0.1, null, null, 0.2, null), PLACE);
    expect(commands.filter((command) => command.kind === "gap")).toHaveLength(2);
    expect(ripplesOf(seam(0.1, null, null, 0.2, null)).map((ripple) => ripple.station)).toEqual([3, 0]);
  });

  it("leaves a gap seen: the ripple before it is rounded no further than a third into it", () => {
    const [gap] = drawStrip(seam(0.1, 0.1, null, 0.2, 0.1), PLACE).filter(
      (command) => command.kind === "gap",
    );
    const before = ripplesOf(seam(0.1, 0.1, null, 0.2, 0.1)).find((ripple) => ripple.station === 1);
    const end = (before?.x ?? 0) + (before?.width ?? 0) + (before?.rx ?? 0);
    expect(gap?.x ?? 0).toBeGreaterThan(end);
    expect(gap?.width ?? 0).toBeGreaterThan(10);
  });

  it("is nothing without stations or without room, and does not fail on a single station", () => {
    expect(drawStrip([], PLACE)).toEqual([]);
    expect(drawStrip(seam(0.1, 0.2), { width: 7, height: 32 })).toEqual([]);
    expect(ripplesOf(seam(0.4))).toHaveLength(1);
  });

  it("takes a measured station without a number as not measured", () => {
    const stations = [
      ...seam(0.1),
      { station_mm: 5, measured: true },
      { station_mm: 10, measured: true, share: Number.NaN },
    ];
    expect(ripplesOf(stations).map((ripple) => ripple.station)).toEqual([0]);
  });
});

describe("thinning", () => {
  const many = Array.from({ length: 2400 }, (_, index) => 0.2 + 0.1 * Math.sin(index));

  it("draws no more ripples than there is room for", () => {
    const ripples = ripplesOf(seam(...many));
    expect(ripples.length).toBeLessThanOrEqual(424 / 5);
    expect(ripples.length).toBeGreaterThan(60);
  });

  it("shows the worst of each group, so that one station beyond the limit is never lost", () => {
    for (const at of [0, 1, 17, 1203, 2398, 2399]) {
      const shares = [...many];
      shares[at] = -1.4;
      const shown = ripplesOf(seam(...shares)).find((ripple) => ripple.share > 1);
      expect(shown?.station).toBe(at);
    }
  });

  it("shows a gap where half of a group or more was not measured, and marks a ripple where less was", () => {
    const half = drawStrip(seam(0.2, null, 0.2, null), { width: 30, height: 32, pitch: 12 });
    expect(half.map((command) => command.kind)).toEqual(["gap"]);
    const third = ripplesOf(seam(0.2, 0.3, null), { width: 20, height: 32, pitch: 12 } as typeof PLACE);
    expect(third.map((ripple) => ripple.partial)).toEqual([true]);
  });

  it("shows what is beyond the limit even in a group that is mostly not measured", () => {
    const ripples = ripplesOf(seam(null, null, 1.3, null), {
      width: 24,
      height: 32,
      pitch: 20,
    } as typeof PLACE);
    expect(ripples.map((ripple) => [ripple.station, ripple.partial])).toEqual([[2, true]]);
  });
});

describe("a strip's axis", () => {
  const stations = seam(0.1, 0.2, 0.3, 0.4, 0.5);

  it("finds the station under each ripple again", () => {
    const frame = stripFrame(stations, PLACE);
    if (frame === null) throw new TypeError("expected a frame");
    stations.forEach((station, index) => {
      expect(stationAtX(frame, stations, xOfStation(frame, station.station_mm))).toBe(index);
    });
    expect(stationAtX(frame, stations, -100)).toBe(0);
    expect(stationAtX(frame, stations, 9999)).toBe(4);
  });

  it("runs over the whole seam where its length is given, and leaves the room it is told to", () => {
    const place = { width: 500, height: 84, left: 52, right: 92, extent_mm: [0, 40] as const };
    const frame = stripFrame(stations, place);
    if (frame === null) throw new TypeError("expected a frame");
    expect(xOfStation(frame, 0)).toBe(52);
    expect(xOfStation(frame, 40)).toBe(408);
    const ripples = ripplesOf(stations, place);
    expect(Math.min(...ripples.map((ripple) => ripple.x))).toBe(52);
    expect(Math.max(...ripples.map((ripple) => ripple.x + ripple.width))).toBeCloseTo(408, 6);
  });

  it("names the nearer of two stations", () => {
    expect(stationAt(stations, 7.4)).toBe(1);
    expect(stationAt(stations, 7.6)).toBe(2);
  });
});

it("writes a ripple as a path: flat, half an ellipse, closed", () => {
  const path = ripplePath({
    kind: "ripple",
    x: 10,
    y: 16,
    width: 6,
    rx: 5,
    ry: 10,
    share: 0,
    station: 0,
    partial: false,
  });
  expect(path).toBe("M10 6h6a5 10 0 0 1 0 20h-6z");
});
