import { ApiProblem } from "@beadroll/client/api-problem";

/** Why somebody was not let in. */
export type SignInRefusal =
  | { readonly why: "wrong" }
  /** Too many tries; `wait_s` is null where the server named no time. */
  | { readonly why: "wait"; readonly wait_s: number | null };

/** What a refusal means to somebody at the door; null where only the server's own words serve. */
export function refusalOf(error: unknown): SignInRefusal | null {
  if (!(error instanceof ApiProblem)) return null;
  if (error.code === "sign-in-failed") return { why: "wrong" };
  if (error.code === "rate-limited") return { why: "wait", wait_s: error.retry_after_s };
  return null;
}

/** A refusal in a sentence or two. It does not say which of the two was wrong: that would tell who has an account. */
export function refusalWords(refusal: SignInRefusal): string {
  if (refusal.why === "wrong") return "Name or password is not right. Check both and try again.";
  const wait = refusal.wait_s === null ? "Wait a while" : `Wait ${waitWords(refusal.wait_s)}`;
  return `Too many tries. ${wait}, then try again.`;
}

/** A waiting time as people say it: seconds up to a minute and a half, minutes above, always rounded up. */
export function waitWords(wait_s: number): string {
  const seconds = Math.max(1, Math.ceil(wait_s));
  if (seconds === 1) return "a second";
  return seconds <= 90 ? `${seconds} seconds` : `${Math.ceil(seconds / 60)} minutes`;
}
