import { describe, expect, test } from "vitest";
import { readScan } from "./read-scan.ts";

const bytesOf = (text: string): Uint8Array => new TextEncoder().encode(text);

describe("reading a scan", () => {
  test("turns inches into millimetres once", () => {
    const outcome = readScan({ name: "a.xyz", bytes: bytesOf("0 0 0\n1 2 3\n"), units: "in" });
    expect(outcome.ok && [...outcome.value.xyz_mm]).toEqual([0, 0, 0, 25.4, 50.8, 3 * 25.4]);
  });
});
