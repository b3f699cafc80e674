import { getMe, refreshSession, signIn, signOut } from "@beadroll/domain/contract/session.contract";
import type { Me } from "@beadroll/domain/schemas/session";
import type { CookieOptions, Request, Response } from "express";
import { refusal } from "../http/refusal.ts";
import { type Route, route } from "../http/route.ts";
import { endFamilyOf } from "./refresh-tokens.ts";
import {
  accountOf,
  type OpenedSession,
  refreshWithToken,
  type SessionDeps,
  signInWithPassword,
} from "./session.service.ts";
import { REFRESH_TOKEN_DAYS } from "./tokens.ts";

const COOKIE = "beadroll_refresh";

/** Signing in and out, and who asks. */
export function sessionRoutes(deps: SessionDeps, publicUrl: string): Route[] {
  const cookie: CookieOptions = {
    httpOnly: true,
    sameSite: "strict",
    secure: publicUrl.startsWith("https:"),
    path: "/api/v1/session",
    maxAge: REFRESH_TOKEN_DAYS * 86_400_000,
  };
  const open = (res: Response, { session, refresh_token }: OpenedSession) => {
    res.cookie(COOKIE, refresh_token, cookie);
    return session;
  };

  return [
    route(signIn, async ({ body, res }) =>
      open(res, await signInWithPassword(deps, body.login, body.password)),
    ),
    route(refreshSession, async ({ req, res }) => {
      refuseForeignOrigin(req);
      return open(res, await refreshWithToken(deps, refreshToken(req)));
    }),
    route(signOut, async ({ req, res }) => {
      refuseForeignOrigin(req);
      const token = refreshToken(req);
      if (token !== undefined) await endFamilyOf(deps.writer, token, deps.now());
      res.clearCookie(COOKIE, { ...cookie, maxAge: undefined });
      return undefined;
    }),
    route(getMe, async ({ caller }): Promise<Me> => {
      if (caller.kind === "nobody" || caller.kind === "system")
        throw refusal("not-signed-in", "Sign in first.");
      const permissions = [...caller.permissions];
      if (caller.kind === "person")
        return {
          kind: "person",
          name: caller.name,
          permissions,
          cell_tag: null,
          account: await accountOf(deps.reader, caller),
        };
      const cell: { tag: string } | undefined = caller.cell_id
        ? await deps.reader("cells").where({ id: caller.cell_id }).first("tag")
        : undefined;
      return { kind: "machine", name: caller.name, permissions, cell_tag: cell?.tag ?? null, account: null };
    }),
  ];
}

function refreshToken(req: Request): string | undefined {
  const token: unknown = req.cookies?.[COOKIE];
  return typeof token === "string" ? token : undefined;
}

/** The cookie is SameSite=Strict; browsers that send an Origin must also send ours. */
function refuseForeignOrigin(req: Request): void {
  const origin = req.get("Origin");
  if (origin === undefined) return;
  if (URL.canParse(origin) && new URL(origin).host === req.get("Host")) return;
  throw refusal("not-allowed", "Sessions are only for the web application of this server.");
}
