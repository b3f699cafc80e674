import { describe, expect, test } from "vitest";
import { calendarUntil, dayOf, instantOf, SHIFT_HOURS, WORKING_DAYS, WORKING_HOURS } from "./calendar.ts";

const TUESDAY = "2026-12-01T15:20:00.000Z";
const SUNDAY = "2026-11-29T03:00:00.000Z";

const weekdays = (ends_at: string) => {
  const calendar = calendarUntil(ends_at);
  const ends = Array.from({ length: WORKING_DAYS }, (_, day) => calendar.at((day + 1) * SHIFT_HOURS - 0.001));
  return ends.map((end_ms) => new Date(end_ms).getUTCDay());
};

describe("the shop's working time", () => {
  test("ends at the instant given", () => {
    expect(instantOf(calendarUntil(TUESDAY).at(WORKING_HOURS))).toBe(TUESDAY);
    expect(instantOf(calendarUntil(SUNDAY).at(WORKING_HOURS))).toBe(SUNDAY);
  });

  test("leaves out weekends, but for the last shift", () => {
    expect(weekdays(TUESDAY).filter((day) => day === 0 || day === 6)).toEqual([]);
    expect(weekdays(SUNDAY).filter((day) => day === 0 || day === 6)).toEqual([0]);
  });

  test("never runs backwards", () => {
    const calendar = calendarUntil(TUESDAY);
    let before_ms = 0;
    for (let hour = 0; hour <= WORKING_HOURS; hour += 0.25) {
      expect(calendar.at(hour)).toBeGreaterThan(before_ms);
      before_ms = calendar.at(hour);
    }
  });

  test("begins five weeks before", () => {
    const calendar = calendarUntil(TUESDAY);
    const days = (calendar.ends_ms - calendar.at(0)) / 86_400_000;
    expect(days).toBeGreaterThan(32);
    expect(days).toBeLessThan(36);
  });

  test("counts calendar dates forth and back", () => {
    expect(dayOf(Date.parse(TUESDAY), 31)).toBe("2027-01-01");
    expect(dayOf(Date.parse(TUESDAY), -1)).toBe("2026-11-30");
  });

  test("refuses a text that is no instant", () => {
    expect(() => calendarUntil("yesterday")).toThrow(RangeError);
  });
});
