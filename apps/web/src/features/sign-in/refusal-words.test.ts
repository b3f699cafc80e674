import { ApiProblem, Unreachable } from "@beadroll/client/api-problem";
import { describe, expect, it } from "vitest";
import { refusalOf, refusalWords, waitWords } from "./refusal-words.ts";

const problem = (code: string, status: number, retryAfterS: number | null = null) =>
  new ApiProblem(
    {
      type: `https://beadroll.example/problems#${code}`,
      title: "Refused",
      status,
      detail: "The server's own words.",
      instance: "req-1",
      errors: [],
    },
    retryAfterS,
  );

const wordsOf = (error: unknown) => {
  const refusal = refusalOf(error);
  return refusal === null ? null : refusalWords(refusal);
};

describe("a refused sign-in", () => {
  it("does not say whether the name or the password is wrong", () => {
    expect(wordsOf(problem("sign-in-failed", 401))).toBe(
      "Name or password is not right. Check both and try again.",
    );
  });

  it("says how long to wait after too many tries", () => {
    expect(wordsOf(problem("rate-limited", 429, 47))).toBe(
      "Too many tries. Wait 47 seconds, then try again.",
    );
    expect(wordsOf(problem("rate-limited", 429))).toBe("Too many tries. Wait a while, then try again.");
  });

  it("leaves everything else to the words of the server or of the network", () => {
    expect(wordsOf(problem("internal", 500))).toBeNull();
    expect(wordsOf(new Unreachable("no answer"))).toBeNull();
    expect(wordsOf(new Error("something else"))).toBeNull();
  });
});

it.each([
  [0, "a second"],
  [0.2, "a second"],
  [60, "60 seconds"],
  [90, "90 seconds"],
  [91, "2 minutes"],
  [600, "10 minutes"],
])("a wait of %s s is %s", (wait_s, words) => expect(waitWords(wait_s)).toBe(words));
