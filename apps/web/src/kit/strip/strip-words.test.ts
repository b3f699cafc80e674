import { expect, it } from "vitest";
import { stationsFromShares } from "./strip-from-shares.ts";
import { stationWords, stripSummary } from "./strip-words.ts";

const beyond = { station_mm: 311, measured: true, share: 1.137, deviation: -3.41 };

it("says a station's place, deviation and share of the limit", () => {
  expect(stationWords(beyond, "mm", "mm")).toEqual({
    at: "311 mm",
    value: "−3.41 mm",
    share: "114 % of the limit, beyond it",
  });
});

it("says it in inches where the screen counts in inches, and degrees always in degrees", () => {
  expect(stationWords(beyond, "mm", "in").value).toBe("−0.134 in");
  expect(stationWords({ station_mm: 10, measured: true, share: 0.4, deviation: 1.25 }, "°", "in").value).toBe(
    "+1.3°",
  );
});

it("never rounds what is beyond the limit down onto it", () => {
  expect(stationWords({ ...beyond, share: 1.001 }, "mm", "mm").share).toBe("101 % of the limit, beyond it");
  expect(stationWords({ ...beyond, share: 1 }, "mm", "mm").share).toBe("100 % of the limit");
});

it("says which way a station lies where only its share is known", () => {
  expect(stationWords({ station_mm: 4, measured: true, share: -0.3 }, "mm", "mm").value).toBe("to minus");
});

it("says plainly that nothing was measured", () => {
  expect(stationWords({ station_mm: 20, measured: false }, "mm", "mm")).toEqual({
    at: "20 mm",
    value: "not measured",
    share: "",
  });
});

it("sums a strip up by its worst station and what was not measured", () => {
  const stations = stationsFromShares([0.1, -0.8, null, 0.3], 100);
  expect(stripSummary(stations, "mm", "mm")).toBe(
    "largest to minus at 38 mm, 80 % of the limit; 1 of 4 stations not measured",
  );
  expect(stripSummary(stationsFromShares([null, null], 100), "mm", "mm")).toBe("not measured, 2 stations");
});

it("puts each bin of a list's strip in its middle", () => {
  expect(stationsFromShares([0.5, null], 100)).toEqual([
    { station_mm: 25, measured: true, share: 0.5 },
    { station_mm: 75, measured: false },
  ]);
});
