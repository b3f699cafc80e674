import { createHash } from "node:crypto";
import { describe, expect, test } from "vitest";
import { z } from "zod";
import { readShared } from "../../vectors/shared-vectors.ts";
import { canonicalBytes, canonicalJson, parseCanonicalJson } from "./canonical-json.ts";
import { toHex } from "./hex.ts";
import { sha256 } from "./sha256.ts";

const Documents = z.object({
  cases: z
    .array(
      z.object({
        name: z.string(),
        input: z.string(),
        output: z.string(),
        output_sha256: z.string().optional(),
      }),
    )
    .min(4),
});
const Rejects = z.object({
  cases: z.array(z.object({ name: z.string(), input: z.string() })).min(5),
  edge: z.array(z.object({ name: z.string(), input: z.string(), output: z.string() })).min(4),
});
const Numbers = z.object({
  cases: z.array(z.object({ ieee754_hex: z.string(), json: z.string().nullable() })).min(20),
});

function double(hex: string): number {
  const view = new DataView(new ArrayBuffer(8));
  view.setBigUint64(0, BigInt(`0x${hex}`));
  return view.getFloat64(0);
}

describe("canonical JSON against RFC 8785", () => {
  test("writes the example of section 3.2 with the bytes the RFC prints", () => {
    const value: unknown = JSON.parse(
      '{"numbers":[333333333.33333329,1E30,4.50,2e-3,0.000000000000000000000000001],' +
        '"string":"\\u20ac$\\u000F\\u000aA\'\\u0042\\u0022\\u005c\\\\\\"\\/","literals":[null,true,false]}',
    );
    expect(canonicalJson(value)).toBe(
      '{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],' +
        '"string":"€$\\u000f\\nA\'B\\"\\\\\\\\\\"/"}',
    );
    expect(toHex(canonicalBytes(value)).slice(0, 32)).toBe("7b226c69746572616c73223a5b6e756c");
  });

  test.each([
    ["0000000000000000", "0"],
    ["8000000000000000", "0"],
    ["0000000000000001", "5e-324"],
    ["7fefffffffffffff", "1.7976931348623157e+308"],
    ["4340000000000000", "9007199254740992"],
    ["44b52d02c7e14af6", "1e+23"],
    ["444b1ae4d6e2ef50", "1e+21"],
    ["3eb0c6f7a0b5ed8d", "0.000001"],
    ["becbf647612f3696", "-0.0000033333333333333333"],
  ])("writes the double %s of appendix B as %s", (hex, text) => {
    expect(canonicalJson(double(hex))).toBe(text);
  });

  test("agrees with every number of appendix B, and refuses those without JSON form", () => {
    const text = readShared("reference/vectors/jcs/numbers-appendix-b.json");
    if (text === undefined) return;
    for (const { ieee754_hex, json } of Numbers.parse(JSON.parse(text)).cases) {
      if (json === null) expect(() => canonicalJson(double(ieee754_hex)), ieee754_hex).toThrow(RangeError);
      else expect(canonicalJson(double(ieee754_hex)), ieee754_hex).toBe(json);
    }
  });

  test("agrees with the first thousand numbers of the official number file", () => {
    const text = readShared("reference/vectors/jcs/es6-numbers-first-1000.txt");
    if (text === undefined) return;
    const lines = text.trim().split("\n");
    expect(lines).toHaveLength(1000);
    for (const line of lines) {
      const [hex = "", printed] = line.split(",");
      expect(canonicalJson(double(hex.padStart(16, "0"))), line).toBe(printed);
    }
  });

  test("agrees with the official documents, byte for byte", () => {
    const text = readShared("reference/vectors/jcs/documents.json");
    if (text === undefined) return;
    for (const { name, input, output, output_sha256 } of Documents.parse(JSON.parse(text)).cases) {
      const value: unknown = JSON.parse(input);
      expect(canonicalJson(value), name).toBe(output);
      const digest = output_sha256 ?? createHash("sha256").update(output).digest("hex");
      expect(toHex(sha256(canonicalBytes(value))), name).toBe(digest);
    }
  });

  test("refuses everything that I-JSON forbids, and writes the edge cases", () => {
    const text = readShared("reference/vectors/jcs/must-reject.json");
    if (text === undefined) return;
    const { cases, edge } = Rejects.parse(JSON.parse(text));
    for (const { name, input } of cases) expect(parseCanonicalJson(input).ok, name).toBe(false);
    for (const { name, input, output } of edge) expect(canonicalJson(JSON.parse(input)), name).toBe(output);
  });
});
