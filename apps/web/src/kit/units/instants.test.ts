import { expect, it } from "vitest";
import { formatDay, formatInstant, formatInstantExactly } from "./instants.ts";

it("shows an instant by the clock of the place", () => {
  expect(formatInstant("2026-11-28T13:05:09.000Z", "Europe/Berlin")).toBe("28 Nov 2026, 14:05");
  expect(formatInstant("2026-11-28T23:30:00Z", "Asia/Tokyo")).toBe("29 Nov 2026, 08:30");
});

it("shows it to the second and with its zone where a record needs it", () => {
  expect(formatInstantExactly("2026-11-28T13:05:09.000Z", "UTC")).toBe("28 Nov 2026, 13:05:09 UTC");
});

it("shows a day as that day, wherever the screen stands", () => {
  expect(formatDay("2026-11-28")).toBe("28 Nov 2026");
});
