import type { RequestHandler } from "express";
import { rateLimit } from "express-rate-limit";
import { sendProblem } from "./problem.ts";

const MINUTE_MS = 60_000;

/** Requests a minute, by key or token where there is one, else by address. */
function limiter(
  perMinute: number,
  keyOf: (header: string | undefined, ip: string) => string,
): RequestHandler {
  return rateLimit({
    windowMs: MINUTE_MS,
    limit: perMinute,
    standardHeaders: "draft-8",
    legacyHeaders: false,
    // The address is this connection's; behind a proxy, `trust proxy` would have to name it.
    validate: { ip: false, keyGeneratorIpFallback: false },
    keyGenerator: (req) => keyOf(req.get("Authorization"), req.ip ?? ""),
    handler: (_req, res) => {
      res.set("Retry-After", String(Math.ceil(MINUTE_MS / 1000)));
      sendProblem(res, [{ code: "rate-limited", detail: `More than ${perMinute} requests in a minute.` }]);
    },
  });
}

/** Guards the API: a cell that pushes all day stays far below, a loop gone wild does not. */
export const apiLimit = (perMinute = 6000): RequestHandler =>
  limiter(perMinute, (header, ip) => header ?? ip);

/** Guards sign-in against guessing from one address. */
export const signInLimit = (perMinute = 60): RequestHandler => limiter(perMinute, (_header, ip) => ip);
