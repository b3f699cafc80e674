import { ApiProblem } from "@beadroll/client/api-problem";
import { type Client, createClient } from "@beadroll/client/transport";
import { refreshSession } from "@beadroll/domain/contract/session.contract";
import { accessToken, sessionEnded, sessionOpened } from "./session-store.ts";

/** Asks without a token: sign-in and the exchange of the refresh cookie. */
export const openClient: Client = createClient({ base_url: "", token: () => null });

let renewing: Promise<boolean> | null = null;

async function exchange(): Promise<boolean> {
  try {
    sessionOpened(await openClient.call(refreshSession, {}));
    return true;
  } catch (error) {
    if (!(error instanceof ApiProblem)) throw error;
    sessionEnded();
    return false;
  }
}

/** Exchanges the refresh cookie for a new token; requests that ask at the same moment share one exchange. */
export function renewSession(): Promise<boolean> {
  renewing ??= exchange().finally(() => {
    renewing = null;
  });
  return renewing;
}

/** The API, beside the application itself: no address is configured in the browser. */
export const api: Client = createClient({ base_url: "", token: accessToken, renew: renewSession });

/** The cursor of a list's first page; TypeScript would take a bare null for the only cursor there is. */
export const FIRST_PAGE = null as string | null;
