import { describe, expect, it } from "vitest";
import { aModel } from "../testing/joint.ts";
import { aScanResult } from "../testing/records.ts";
import { columnsText } from "./columns.ts";
import { evaluationText } from "./evaluation-text.ts";
import { faultLine } from "./fault-text.ts";
import { type Look, lookOf } from "./look.ts";
import { stripText } from "./strip-text.ts";
import { verdictText } from "./verdict-text.ts";

const PLAIN: Look = { colour: false, true_colour: false, width: null };
const BRIGHT: Look = { colour: true, true_colour: true, width: 40 };
// A stream that says it is a terminal: the rest of it is not asked.
const terminal = (isTTY: boolean) => ({ isTTY, columns: 80 }) as NodeJS.WriteStream;

describe("the look of the output", () => {
  it("is coloured on a terminal only, and not where NO_COLOR is set", () => {
    expect(lookOf(terminal(true), { COLORTERM: "truecolor" })).toEqual({
      colour: true,
      true_colour: true,
      width: 80,
    });
    expect(lookOf(terminal(true), {})).toEqual({ colour: true, true_colour: false, width: 80 });
    expect(lookOf(terminal(true), { NO_COLOR: "1", COLORTERM: "truecolor" }).colour).toBe(false);
    expect(lookOf(terminal(true), { TERM: "dumb" }).colour).toBe(false);
    expect(lookOf(terminal(false), {})).toEqual({ colour: false, true_colour: false, width: null });
  });
});

describe("a bead strip in one line", () => {
  it("rises with the share of the limit used, whichever side", () => {
    expect(stripText([0, 0.13, -0.5, 0.99, 1], PLAIN)).toBe("▁▂▅██");
  });

  it("draws beyond the limit and not measured apart, without colour", () => {
    expect(stripText([1.02, -2, null], PLAIN)).toBe("!!·");
  });

  it("takes the temper colours where the terminal has them", () => {
    expect(stripText([0.5], BRIGHT)).toBe("\u001b[38;2;214;164;76m▅\u001b[0m");
  });
});

describe("an evaluation for people", () => {
  it("names verdict, reasons, strip, figures, coverage, ends and rigid part", () => {
    const text = evaluationText(aScanResult("hold"), aModel(), PLAIN);
    expect(text.split("\n")).toEqual([
      "◆ hold   test-t-joint   fillet t, 40.0 mm, 1200 points",
      "  ◆ Gap 1.92 mm at 90 mm: above 1.50 mm",
      "",
      "  ▁·",
      "  0 40.0 mm",
      "  height: share of the limit used; ! beyond the limit; · not measured",
      "",
      "               largest    at mm      rms     95 %",
      "  gap mm         1.920     90.0    0.400    1.200",
      "",
      "  coverage    1 of 2 stations measured (50.0 %), longest blind stretch 20.0 mm (10.0 to 30.0)",
      "  ends        start 0.0 mm, end 40.0 mm (the scan ends there)",
      "  rigid part  moved 0.000, 0.200, 0.000 mm, turned 0.000, 0.000, -0.100 deg; movement along the seam cannot be seen",
    ]);
  });

  it("says verdicts by shape and word, with or without colour", () => {
    expect(verdictText("adapt", PLAIN)).toBe("▲ adapt");
    expect(verdictText("adapt", BRIGHT)).toBe("\u001b[1;33m▲ adapt\u001b[0m");
  });
});

describe("columns", () => {
  it("cut long lines at the terminal's edge and nowhere else", () => {
    const rows = [["part", "a long title that runs on and on and on"]];
    expect(columnsText(["kind", "title"], rows, PLAIN)).toContain("on and on and on");
    const [, line] = columnsText(["kind", "title"], rows, { ...BRIGHT, colour: false }).split("\n");
    expect(line).toBe("part  a long title that runs on and on …");
    expect(line?.length).toBe(40);
  });
});

describe("a fault on one line", () => {
  it("begins with file, line and column, said once", () => {
    const detail = "scans/a.csv, line 3: column z_mm holds nothing";
    expect(faultLine({ code: "file-value-invalid", detail, line: 3, field: "z_mm" }, "scans/a.csv")).toBe(
      "scans/a.csv:3: z_mm: column z_mm holds nothing",
    );
  });

  it("begins with file and byte where there are no lines", () => {
    const detail = "a.ply, byte 120: the file ends";
    expect(faultLine({ code: "file-truncated", detail, byte: 120 }, "a.ply")).toBe(
      "a.ply: byte 120: the file ends",
    );
  });

  it("lets no text from a file steer the terminal", () => {
    expect(faultLine({ code: "file-value-invalid", detail: "holds \u001b]0;x\u0007" })).toBe("holds  ]0;x ");
  });
});
