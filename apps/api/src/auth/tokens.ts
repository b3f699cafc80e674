import { createHash, randomBytes } from "node:crypto";
import jwt from "jsonwebtoken";

/** Seconds an access token lives; after that the refresh cookie gives a new one. */
export const ACCESS_TOKEN_S = 600;
/** Days a refresh token lives unused. */
export const REFRESH_TOKEN_DAYS = 14;

const ISSUER = "beadroll";

/** A short-lived access token for a user. */
export function signAccessToken(secret: string, userId: string, now: Date): string {
  const iat = Math.floor(now.getTime() / 1000);
  return jwt.sign({ sub: userId, iat, exp: iat + ACCESS_TOKEN_S, iss: ISSUER }, secret, {
    algorithm: "HS256",
  });
}

/** The user an access token was signed for, or null when it is not valid any more or never was. */
export function readAccessToken(secret: string, token: string, now: Date): string | null {
  try {
    const claims = jwt.verify(token, secret, {
      algorithms: ["HS256"],
      issuer: ISSUER,
      clockTimestamp: Math.floor(now.getTime() / 1000),
    });
    return typeof claims === "object" && typeof claims.sub === "string" ? claims.sub : null;
  } catch (error) {
    if (error instanceof jwt.JsonWebTokenError) return null;
    throw error;
  }
}

/** Prefix of every machine key, so that a leaked one is recognised. */
export const KEY_PREFIX = "brk_";

/** A new secret of 256 random bits, in base64url. */
export const newSecret = (): string => randomBytes(32).toString("base64url");

/** What is stored of a secret of 256 random bits: its SHA-256; slow hashes are for passwords people choose. */
export const secretHash = (secret: string): string => createHash("sha256").update(secret).digest("hex");
