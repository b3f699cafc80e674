import type { ApiKey, ApiKeyCreate, ApiKeyMade, User, UserCreate } from "@beadroll/domain/schemas/user";
import type { Knex } from "knex";
import { hashPassword } from "../auth/passwords.ts";
import { KEY_PREFIX, newSecret, secretHash } from "../auth/tokens.ts";
import { type PageRequest, readPage } from "../db/keyset.ts";
import { type Page, pageOf } from "../db/page.ts";
import { refusal } from "../http/refusal.ts";
import { type ChangeContext, change } from "../ledger/change.ts";

type UserRow = Omit<User, "roles"> & { readonly roles: string };
type KeyRow = Omit<ApiKey, "scopes"> & { readonly scopes: string };

const PREFIX_LENGTH = KEY_PREFIX.length + 4;

const userQuery = (db: Knex): Knex.QueryBuilder =>
  db("users").select(
    "users.id",
    "users.login",
    "users.name",
    db.raw("(select json_group_array(role) from user_roles where user_roles.user_id = users.id) as roles"),
    "users.person_id",
    "users.disabled_at",
    "users.created_at",
    "users.version",
  );

const toUser = (row: UserRow): User => ({ ...row, roles: JSON.parse(row.roles) });
const toKey = (row: KeyRow): ApiKey => ({ ...row, scopes: JSON.parse(row.scopes) });

/** Accounts by sign-in name. */
export async function listUsers(db: Knex, request: PageRequest): Promise<Page<User>> {
  const page = await readPage<UserRow>(
    userQuery(db),
    { columns: ["users.login"], descending: false },
    request,
  );
  return pageOf(page, toUser);
}

/**
 * Makes an account. The password is hashed before the transaction, which must not wait for it.
 * @throws Refusal conflict when the name is taken, not-found for an unknown person
 */
export async function createUser(
  context: ChangeContext,
  create: UserCreate,
  passwordCost?: number,
): Promise<User> {
  const password_hash = await hashPassword(create.password, passwordCost);
  const login = create.login.toLowerCase();
  return change(context, "user.create", async (trx) => {
    const twin: unknown = await trx.read("users").where({ login }).first("id");
    if (twin !== undefined)
      throw refusal("conflict", `The sign-in name ${login} is taken.`, { field: "login" });
    const person_id = create.person_id ?? null;
    const person: unknown =
      person_id === null ? true : await trx.read("people").where({ id: person_id }).first("id");
    if (person === undefined)
      throw refusal("not-found", "No person here has that id.", { field: "person_id" });
    const id = trx.newId();
    await trx.insert("users", {
      id,
      login,
      name: create.name,
      person_id,
      password_hash,
      created_at: trx.at,
      version: 1,
    });
    for (const role of new Set(create.roles)) await trx.insert("user_roles", { user_id: id, role });
    const row: UserRow = await userQuery(trx.read).where({ "users.id": id }).first();
    return { value: toUser(row), subjects: [id] };
  });
}

const KEY_COLUMNS = [
  "api_keys.id",
  "api_keys.name",
  "api_keys.prefix",
  "api_keys.scopes",
  "api_keys.cell_id",
  "api_keys.created_at",
  "api_keys.last_used_at",
  "api_keys.revoked_at",
];

/** Machine keys, newest first. */
export async function listKeys(db: Knex, request: PageRequest): Promise<Page<ApiKey>> {
  const keyset = { columns: ["api_keys.created_at", "api_keys.id"], descending: true };
  return pageOf(await readPage<KeyRow>(db("api_keys").select(KEY_COLUMNS), keyset, request), toKey);
}

/** Makes a machine's key. @throws Refusal not-found for an unknown cell */
export function createKey(
  context: ChangeContext,
  create: ApiKeyCreate,
  secret: string = `${KEY_PREFIX}${newSecret()}`,
): Promise<ApiKeyMade> {
  return change(context, "key.create", async (trx) => {
    const cell_id = create.cell_id ?? null;
    const cell: unknown =
      cell_id === null ? true : await trx.read("cells").where({ id: cell_id }).first("id");
    if (cell === undefined) throw refusal("not-found", "No cell here has that id.", { field: "cell_id" });
    const id = trx.newId();
    await trx.insert("api_keys", {
      id,
      name: create.name,
      prefix: secret.slice(0, PREFIX_LENGTH),
      key_hash: secretHash(secret),
      scopes: JSON.stringify([...new Set(create.scopes)]),
      cell_id,
      created_at: trx.at,
    });
    const row: KeyRow = await trx.read("api_keys").where({ id }).first(KEY_COLUMNS);
    return { value: { ...toKey(row), secret }, subjects: [id] };
  });
}

/** Withdraws a machine's key. @throws Refusal not-found, state-conflict when it is withdrawn already */
export function revokeKey(context: ChangeContext, id: string): Promise<undefined> {
  return change(context, "key.revoke", async (trx) => {
    const key: { revoked_at: string | null } | undefined = await trx
      .read("api_keys")
      .where({ id })
      .first("revoked_at");
    if (key === undefined) throw refusal("not-found", "No key here has that id.");
    if (key.revoked_at !== null)
      throw refusal("state-conflict", `The key was withdrawn at ${key.revoked_at}.`);
    await trx.update("api_keys", { id }, { revoked_at: trx.at });
    return { value: undefined, subjects: [id] };
  });
}
