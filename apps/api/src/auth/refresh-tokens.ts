import type { Knex } from "knex";
import { v7 as uuidv7 } from "uuid";
import { newSecret, REFRESH_TOKEN_DAYS, secretHash } from "./tokens.ts";

/** Seconds in which a token just used may be used once more: two tabs that wake at the same moment. */
const TWIN_S = 10;
const DAY_MS = 86_400_000;

interface TokenRow {
  readonly id: string;
  readonly user_id: string;
  readonly family_id: string;
  readonly expires_at: string;
  readonly used_at: string | null;
  readonly revoked_at: string | null;
}

async function issue(db: Knex, userId: string, familyId: string, now: Date): Promise<string> {
  const secret = newSecret();
  await db("refresh_tokens").insert({
    id: uuidv7(),
    user_id: userId,
    family_id: familyId,
    token_hash: secretHash(secret),
    created_at: now.toISOString(),
    expires_at: new Date(now.getTime() + REFRESH_TOKEN_DAYS * DAY_MS).toISOString(),
  });
  return secret;
}

/** The first refresh token of a sign-in. */
export function startFamily(db: Knex, userId: string, now: Date): Promise<string> {
  return issue(db, userId, uuidv7(), now);
}

/**
 * Exchanges a refresh token for the next of its family. A token used before ends the whole family: somebody holds
 * a copy, and it cannot be known who.
 * @returns null when the token gives nothing any more
 */
export function rotate(
  db: Knex,
  secret: string,
  now: Date,
): Promise<{ user_id: string; secret: string } | null> {
  return db.transaction(async (trx) => {
    const token: TokenRow | undefined = await trx("refresh_tokens")
      .where({ token_hash: secretHash(secret) })
      .first("id", "user_id", "family_id", "expires_at", "used_at", "revoked_at");
    if (token === undefined || token.revoked_at !== null || token.expires_at <= now.toISOString())
      return null;
    if (token.used_at !== null && now.getTime() - Date.parse(token.used_at) > TWIN_S * 1000) {
      await endFamily(trx, token.family_id, now);
      return null;
    }
    if (token.used_at === null)
      await trx("refresh_tokens").where({ id: token.id }).update({ used_at: now.toISOString() });
    return { user_id: token.user_id, secret: await issue(trx, token.user_id, token.family_id, now) };
  });
}

async function endFamily(db: Knex, familyId: string, now: Date): Promise<void> {
  await db("refresh_tokens")
    .where({ family_id: familyId })
    .whereNull("revoked_at")
    .update({ revoked_at: now.toISOString() });
}

/** Ends the sign-in that a refresh token belongs to. */
export async function endFamilyOf(db: Knex, secret: string, now: Date): Promise<void> {
  const token: Pick<TokenRow, "family_id"> | undefined = await db("refresh_tokens")
    .where({ token_hash: secretHash(secret) })
    .first("family_id");
  if (token !== undefined) await endFamily(db, token.family_id, now);
}
