/** Exit codes: a contract with the programs that call us (docs/guides/cell.md). */
export const EXIT = {
  done: 0,
  failure: 1,
  usage: 2,
  hold: 10,
  not_ready: 11,
  not_verified: 12,
  queued: 20,
  refused: 30,
  not_allowed: 40,
} as const;
export type ExitCode = (typeof EXIT)[keyof typeof EXIT];

/** What each code says, as `beadroll --help` lists them. */
export const EXIT_MEANINGS: Readonly<Record<ExitCode, string>> = {
  0: "done; for a scan: within or adapt",
  1: "unexpected failure",
  2: "wrong usage or unreadable input",
  10: "verdict hold",
  11: "not ready",
  12: "verification failed",
  20: "server not reachable: a push is kept in the queue, nothing is lost",
  30: "the server refused the record",
  40: "not signed in, or not allowed",
};
