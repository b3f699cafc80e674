import { type KeyScope, type Permission, permissionsOf, type Role } from "@beadroll/domain/auth/permissions";
import type { Request } from "express";
import type { Knex } from "knex";
import { refusal } from "../http/refusal.ts";
import { type Caller, NOBODY } from "./caller.ts";
import { KEY_PREFIX, readAccessToken, secretHash } from "./tokens.ts";

/** Tells who makes a request. @throws Refusal not-signed-in for a token or key that is not valid */
export type Authenticate = (req: Request) => Promise<Caller>;

interface UserRow {
  readonly id: string;
  readonly login: string;
  readonly name: string;
  readonly roles: string;
}

interface KeyRow {
  readonly id: string;
  readonly name: string;
  readonly scopes: string;
  readonly cell_id: string | null;
}

/** The caller a user id stands for, with the roles held now; null when the account is closed. */
export async function personCaller(
  db: Knex,
  userId: string,
): Promise<Extract<Caller, { kind: "person" }> | null> {
  const user: UserRow | undefined = await db("users")
    .where({ "users.id": userId })
    .whereNull("users.disabled_at")
    .first(
      "users.id",
      "users.login",
      "users.name",
      db.raw("(select json_group_array(role) from user_roles where user_roles.user_id = users.id) as roles"),
    );
  if (user === undefined) return null;
  const roles: Role[] = JSON.parse(user.roles);
  return {
    kind: "person",
    user_id: user.id,
    login: user.login,
    name: user.name,
    roles,
    permissions: new Set(permissionsOf(roles)),
  };
}

async function machineCaller(db: Knex, secret: string): Promise<Caller | null> {
  const key: KeyRow | undefined = await db("api_keys")
    .where({ key_hash: secretHash(secret) })
    .whereNull("revoked_at")
    .first("id", "name", "scopes", "cell_id");
  if (key === undefined) return null;
  const scopes: KeyScope[] = JSON.parse(key.scopes);
  return {
    kind: "machine",
    key_id: key.id,
    name: key.name,
    cell_id: key.cell_id,
    permissions: new Set<Permission>(scopes),
  };
}

/**
 * Sign-in by the Authorization header: `Bearer` with a person's access token or a machine's key. No header is
 * nobody; a header that is not valid is refused, so that a caller never acts as less than it thinks it is.
 */
export function authenticator(reader: Knex, secret: string, now: () => Date): Authenticate {
  return async (req) => {
    const header = req.get("Authorization");
    if (header === undefined) return NOBODY;
    const token = /^Bearer +(\S+)$/i.exec(header)?.[1];
    if (token === undefined)
      throw refusal("not-signed-in", "Authorization: expected Bearer and a token or key.");
    if (token.startsWith(KEY_PREFIX)) {
      const machine = await machineCaller(reader, token);
      if (machine) return machine;
      throw refusal("not-signed-in", "This key is not known, or it was withdrawn.");
    }
    const userId = readAccessToken(secret, token, now());
    const person = userId === null ? null : await personCaller(reader, userId);
    if (person) return person;
    throw refusal("not-signed-in", "The access token has ended; refresh the session.");
  };
}
