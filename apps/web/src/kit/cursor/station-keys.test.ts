import { describe, expect, it } from "vitest";
import { nearestStation } from "./nearest-station.ts";
import { indexAfterKey } from "./station-keys.ts";

describe("a cursor along a seam", () => {
  it("goes from station to station with the arrow keys, by ten with the page keys, and to both ends", () => {
    expect(indexAfterKey("ArrowRight", 10, 30)).toBe(11);
    expect(indexAfterKey("ArrowLeft", 10, 30)).toBe(9);
    expect(indexAfterKey("PageUp", 10, 30)).toBe(20);
    expect(indexAfterKey("Home", 10, 30)).toBe(0);
    expect(indexAfterKey("End", 10, 30)).toBe(29);
  });

  it("stays on the seam", () => {
    expect(indexAfterKey("ArrowLeft", 0, 30)).toBe(0);
    expect(indexAfterKey("PageUp", 25, 30)).toBe(29);
    expect(indexAfterKey("End", 0, 0)).toBeNull();
  });

  it("leaves other keys to the page", () => {
    expect(indexAfterKey("Tab", 10, 30)).toBeNull();
    expect(indexAfterKey("a", 10, 30)).toBeNull();
  });

  it("stops at the station nearest to where somebody points, as a look at each of them finds it", () => {
    const stations_mm = [0, 2, 3, 7, 7.5, 20, 21];
    for (let place_mm = -5; place_mm < 30; place_mm += 0.3) {
      const distances = stations_mm.map((station_mm) => Math.abs(station_mm - place_mm));
      const nearest = distances[nearestStation(stations_mm, place_mm)];
      expect(nearest).toBe(Math.min(...distances));
    }
    expect(nearestStation([5], 900)).toBe(0);
  });
});
