import { describe, expect, test } from "vitest";
import { Random } from "./random.ts";

const many = (random: Random, count: number) => Array.from({ length: count }, () => random.uniform());

describe("numbers that look like chance", () => {
  test("are the same for the same seed and subject", () => {
    expect(many(new Random(7, "scan a"), 50)).toEqual(many(new Random(7, "scan a"), 50));
  });

  test("differ between seeds and between subjects", () => {
    const first = many(new Random(7, "scan a"), 20);
    expect(many(new Random(8, "scan a"), 20)).not.toEqual(first);
    expect(many(new Random(7, "scan b"), 20)).not.toEqual(first);
  });

  test("fill 0 to 1 evenly", () => {
    const values = many(new Random(3, "evenness"), 20_000);
    for (let tenth = 0; tenth < 10; tenth++) {
      const inside = values.filter((value) => value >= tenth / 10 && value < (tenth + 1) / 10).length;
      expect(inside).toBeGreaterThan(1800);
      expect(inside).toBeLessThan(2200);
    }
  });

  test("are normally distributed where asked: mean 0, standard deviation 1", () => {
    const random = new Random(11, "normal");
    const values = Array.from({ length: 20_000 }, () => random.normal());
    const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
    const variance = values.reduce((sum, value) => sum + (value - mean) ** 2, 0) / values.length;
    expect(Math.abs(mean)).toBeLessThan(0.03);
    expect(Math.abs(variance - 1)).toBeLessThan(0.04);
    expect(values.filter((value) => Math.abs(value) > 1.96).length / values.length).toBeCloseTo(0.05, 2);
  });
});
