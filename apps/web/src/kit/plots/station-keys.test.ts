import { describe, expect, it } from "vitest";
import { placeMarks } from "./mark-places.ts";
import { stationAfterKey } from "./station-keys.ts";

const STATIONS = Array.from({ length: 30 }, (_, index) => index * 5);

describe("the cursor of plots", () => {
  it("goes from station to station with the arrow keys, by ten with the page keys, and to both ends", () => {
    expect(stationAfterKey("ArrowRight", STATIONS, 50)).toBe(55);
    expect(stationAfterKey("ArrowLeft", STATIONS, 52)).toBe(45);
    expect(stationAfterKey("PageUp", STATIONS, 50)).toBe(100);
    expect(stationAfterKey("Home", STATIONS, 50)).toBe(0);
    expect(stationAfterKey("End", STATIONS, null)).toBe(145);
  });

  it("stays on the seam", () => {
    expect(stationAfterKey("ArrowLeft", STATIONS, 0)).toBe(0);
    expect(stationAfterKey("PageUp", STATIONS, 140)).toBe(145);
    expect(stationAfterKey("End", [], null)).toBeNull();
  });

  it("leaves other keys to the page", () => {
    expect(stationAfterKey("Tab", STATIONS, 50)).toBeNull();
    expect(stationAfterKey("a", STATIONS, 50)).toBeNull();
  });
});

describe("marks above plots", () => {
  it("share a line where their words have room, and take another where they do not", () => {
    expect(placeMarks([100, 400, 410], 900).map((place) => place.line)).toEqual([0, 0, 1]);
  });

  it("write to the left where the plot ends, without running into a neighbour", () => {
    const places = placeMarks([700, 860], 900);
    expect(places.map((place) => place.isLate)).toEqual([false, true]);
    expect(places.map((place) => place.line)).toEqual([0, 1]);
  });
});
