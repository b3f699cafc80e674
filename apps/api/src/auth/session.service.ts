import type { Account, Session } from "@beadroll/domain/schemas/session";
import type { Knex } from "knex";
import { Refusal, refusal } from "../http/refusal.ts";
import { personCaller } from "./authenticate.ts";
import type { Caller } from "./caller.ts";
import { isPassword } from "./passwords.ts";
import { rotate, startFamily } from "./refresh-tokens.ts";
import { ACCESS_TOKEN_S, signAccessToken } from "./tokens.ts";

/** Failures in a row before an account waits, and for how long. */
const FAILURES_BEFORE_WAIT = 5;
const WAIT_S = 60;

interface SignInRow {
  readonly id: string;
  readonly password_hash: string;
  readonly failed_sign_ins: number;
  readonly wait_until: string | null;
  readonly disabled_at: string | null;
}

/** What sign-in needs. */
export interface SessionDeps {
  readonly writer: Knex;
  readonly reader: Knex;
  readonly secret: string;
  readonly now: () => Date;
}

/** A session and the refresh token that goes into the cookie. */
export interface OpenedSession {
  readonly session: Session;
  readonly refresh_token: string;
}

/** The account behind a signed-in person. */
export async function accountOf(db: Knex, caller: Extract<Caller, { kind: "person" }>): Promise<Account> {
  const person: { tag: string } | undefined = await db("people")
    .join("users", "users.person_id", "people.id")
    .where({ "users.id": caller.user_id })
    .first("people.tag");
  return {
    user_id: caller.user_id,
    login: caller.login,
    name: caller.name,
    roles: [...caller.roles],
    permissions: [...caller.permissions],
    person_tag: person?.tag ?? null,
  };
}

async function opened(deps: SessionDeps, userId: string, refreshToken: string): Promise<OpenedSession> {
  const caller = await personCaller(deps.reader, userId);
  if (!caller) throw refusal("not-signed-in", "The account is closed.");
  return {
    refresh_token: refreshToken,
    session: {
      access_token: signAccessToken(deps.secret, userId, deps.now()),
      expires_in_s: ACCESS_TOKEN_S,
      account: await accountOf(deps.reader, caller),
    },
  };
}

function refuseWhileWaiting(user: SignInRow | undefined, now: Date): void {
  if (!user?.wait_until || user.wait_until <= now.toISOString()) return;
  const wait_s = Math.ceil((Date.parse(user.wait_until) - now.getTime()) / 1000);
  throw new Refusal(
    [{ code: "rate-limited", detail: `Too many failed sign-ins; try again in ${wait_s} s.` }],
    wait_s,
  );
}

async function countFailure(deps: SessionDeps, user: SignInRow): Promise<void> {
  const failures = user.failed_sign_ins + 1;
  const waits = failures >= FAILURES_BEFORE_WAIT;
  await deps
    .writer("users")
    .where({ id: user.id })
    .update({
      failed_sign_ins: waits ? 0 : failures,
      wait_until: waits ? new Date(deps.now().getTime() + WAIT_S * 1000).toISOString() : null,
    });
}

/** Signs a person in. @throws Refusal sign-in-failed, the same for an unknown name and a wrong password; rate-limited */
export async function signInWithPassword(
  deps: SessionDeps,
  login: string,
  password: string,
): Promise<OpenedSession> {
  const user: SignInRow | undefined = await deps
    .reader("users")
    .where({ login: login.toLowerCase() })
    .first("id", "password_hash", "failed_sign_ins", "wait_until", "disabled_at");
  refuseWhileWaiting(user, deps.now());
  const right = await isPassword(password, user?.password_hash ?? null);
  if (user === undefined || !right || user.disabled_at !== null) {
    if (user !== undefined) await countFailure(deps, user);
    throw refusal("sign-in-failed", "The name or the password is wrong.");
  }
  if (user.failed_sign_ins > 0 || user.wait_until !== null)
    await deps.writer("users").where({ id: user.id }).update({ failed_sign_ins: 0, wait_until: null });
  return opened(deps, user.id, await startFamily(deps.writer, user.id, deps.now()));
}

/** Goes on with a session by its refresh token. @throws Refusal not-signed-in */
export async function refreshWithToken(deps: SessionDeps, token: string | undefined): Promise<OpenedSession> {
  const next = token === undefined ? null : await rotate(deps.writer, token, deps.now());
  if (!next) throw refusal("not-signed-in", "The session has ended; sign in again.");
  return opened(deps, next.user_id, next.secret);
}
