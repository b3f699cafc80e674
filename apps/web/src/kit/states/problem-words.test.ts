import { LOT_STATES } from "@beadroll/domain/schemas/lot";
import { VERDICTS } from "@beadroll/domain/schemas/scan-result";
import { SEAM_STATES } from "@beadroll/domain/schemas/seam";
import { describe, expect, it } from "vitest";
import { problemFrom, problemWords } from "./problem-words.ts";
import { isStateName, STATE_LOOKS } from "./state-words.ts";

const PROBLEM = {
  type: "/docs/api/problems#version-stale",
  title: "Somebody changed this meanwhile",
  status: 412,
  detail: "You saw version 3, it is now 4.",
  instance: "0193782a",
  errors: [
    { code: "file-value-invalid", detail: "Expected a number.", line: 418, field: "z_mm" },
    { code: "request-invalid", detail: "Too thick.", pointer: "/pieces/0/thickness_mm" },
    { code: "request-invalid", detail: "Nothing fits." },
  ],
};

describe("a problem in plain words", () => {
  it("says what happened, what is safe and what to do", () => {
    expect(problemWords(PROBLEM)).toMatchObject({
      title: "Somebody changed this meanwhile",
      detail: "You saw version 3, it is now 4.",
      safe: "Nothing was overwritten. What you typed is still here.",
      todo: "Load it again and repeat your change.",
      request_id: "0193782a",
    });
  });

  it("names the place of each fault as it is known: line and column, field, or none", () => {
    expect(problemWords(PROBLEM).faults.map((fault) => fault.place)).toEqual([
      "line 418, z_mm",
      "pieces, 0, thickness_mm",
      null,
    ]);
  });

  it("is found inside an error that carries it", () => {
    const error = Object.assign(new Error("412"), { problem: PROBLEM });
    expect(problemFrom(error).title).toBe("Somebody changed this meanwhile");
  });

  it("tells a server that did not answer from a fault of the program", () => {
    expect(problemFrom(new TypeError("Failed to fetch")).title).toBe("The server did not answer");
    expect(problemFrom(new TypeError("x is undefined")).title).toBe("This part of the page failed");
    expect(problemFrom("anything").title).toBe("This part of the page failed");
  });
});

describe("states", () => {
  it("have a look for every seam state, verdict and lot state that exists", () => {
    for (const state of [...SEAM_STATES, ...VERDICTS, ...LOT_STATES]) expect(isStateName(state)).toBe(true);
  });

  it("are told apart by shape alone where they call for different deeds", () => {
    expect(STATE_LOOKS.within.shape).not.toBe(STATE_LOOKS.adapt.shape);
    expect(STATE_LOOKS.adapt.shape).not.toBe(STATE_LOOKS.hold.shape);
    for (const look of Object.values(STATE_LOOKS)) {
      expect(look.shape === "diamond").toBe(look.tone === "stop");
      expect(look.shape === "triangle").toBe(look.tone === "attend");
    }
  });

  it("do not take a word for a state that is none", () => {
    expect(isStateName("toString")).toBe(false);
  });
});
