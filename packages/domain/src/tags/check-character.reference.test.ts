import { describe, expect, test } from "vitest";
import { z } from "zod";
import { readShared } from "../../vectors/shared-vectors.ts";
import { checkCharacter, hasValidCheck, symbolThatFits } from "./check-character.ts";

const Generated = z.object({ cases: z.array(z.object({ body: z.string(), mod37_2: z.string() })).min(10) });

describe("check characters against ISO/IEC 7064 MOD 37-2", () => {
  test("gives H for the donation number G123498654321 of the ISBT 128 worked example", () => {
    expect(checkCharacter("G123498654321")).toBe("H");
    expect(hasValidCheck("G123498654321H")).toBe(true);
  });

  test("gives Y for G123489654321, the example of a public implementation's documentation", () => {
    expect(checkCharacter("G123489654321")).toBe("Y");
  });

  test("agrees with every case of the generated set", () => {
    const text = readShared("reference/vectors/checkchars/generated.json");
    if (text === undefined) return;
    for (const { body, mod37_2 } of Generated.parse(JSON.parse(text)).cases) {
      expect(checkCharacter(body), body).toBe(mod37_2);
    }
  });

  test("finds the unreadable symbol of a known number", () => {
    expect(symbolThatFits("G1234?8654321H", 5)).toBe("9");
  });

  test("refuses a symbol that the standard does not know", () => {
    expect(() => checkCharacter("g1")).toThrow(RangeError);
    expect(() => checkCharacter("A-1")).toThrow(RangeError);
    expect(() => symbolThatFits("ABC", 3)).toThrow(RangeError);
  });
});
