import type { Permission } from "@beadroll/domain/auth/permissions";
import {
  signIn as signInContract,
  signOut as signOutContract,
} from "@beadroll/domain/contract/session.contract";
import type { Account } from "@beadroll/domain/schemas/session";
import { useSyncExternalStore } from "react";
import { openClient, renewSession } from "./client.ts";
import { leadOn } from "./lead-on.ts";
import { PATHS } from "./paths.ts";
import { queryClient } from "./providers.tsx";
import { onSessionChange, sessionEnded, sessionOpened, sessionState } from "./session-store.ts";

/** Who is signed in, or null. */
export function useAccount(): Account | null {
  const state = useSyncExternalStore(onSessionChange, sessionState);
  return state.status === "in" ? state.account : null;
}

/** Whether the account's roles allow something. The server stays the judge; this only decides what is offered. */
export function useMay(permission: Permission): boolean {
  return useAccount()?.permissions.includes(permission) ?? false;
}

/** The sign-in page's address that leads back to where one was. */
export const signInPath = (to: string): string =>
  `${PATHS.signIn.path}?${new URLSearchParams({ to }).toString()}`;

/** For loaders: goes on when somebody is signed in, else leads to the sign-in page and back. @throws a redirect */
export async function requireSession(request: Request): Promise<void> {
  if (sessionState().status === "unknown") await renewSession();
  if (sessionState().status === "in") return;
  const { pathname, search } = new URL(request.url);
  throw leadOn(request, signInPath(`${pathname}${search}`));
}

/** Signs in. @throws ApiProblem when name or password is wrong or the account waits */
export async function signIn(login: string, password: string): Promise<void> {
  sessionOpened(await openClient.call(signInContract, { body: { login, password } }));
}

/** Signs out here and forgets what the server said to this person. */
export async function signOut(): Promise<void> {
  await openClient.call(signOutContract, {});
  queryClient.clear();
  sessionEnded();
}
