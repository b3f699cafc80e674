import type { Account, Session } from "@beadroll/domain/schemas/session";

/** Who uses this screen; `unknown` until the refresh cookie has been tried. */
export type SessionState =
  | { readonly status: "unknown" }
  | { readonly status: "out" }
  | { readonly status: "in"; readonly account: Account };

type Listener = () => void;

let state: SessionState = { status: "unknown" };
// The access token lives in memory alone: no script of another origin and no storage ever holds it.
let token: string | null = null;
const listeners = new Set<Listener>();

function become(next: SessionState): void {
  state = next;
  for (const listener of listeners) listener();
}

/** The session as it is, for useSyncExternalStore. */
export const sessionState = (): SessionState => state;

/** Calls back when the session changes. */
export function onSessionChange(listener: Listener): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

/** The access token for the next request; null when nobody is signed in. */
export const accessToken = (): string | null => token;

/** A session was opened or renewed. */
export function sessionOpened(session: Session): void {
  token = session.access_token;
  become({ status: "in", account: session.account });
}

/** The session has ended, by its end or by signing out. */
export function sessionEnded(): void {
  token = null;
  become({ status: "out" });
}
