import type { Knex } from "knex";
import { run } from "./sql.ts";

export { down } from "./sql.ts";

/** People with their qualifications, cells, accounts, sessions and machine keys. */
export function up(knex: Knex): Promise<void> {
  return run(knex, [
    `create table people (
      id text primary key,
      tag text not null unique,
      name text not null,
      job text not null,
      active integer not null default 1 check (active in (0, 1)),
      created_at text not null,
      version integer not null default 1
    ) STRICT`,
    `create index people_name on people (name, id)`,
    `create table qualifications (
      id text primary key,
      person_id text not null references people (id),
      standard text not null,
      number text not null,
      process text not null,
      range text not null,
      issued_on text not null,
      valid_until text not null check (valid_until >= issued_on),
      created_at text not null,
      unique (standard, number)
    ) STRICT`,
    `create index qualifications_person on qualifications (person_id, process, valid_until)`,
    `create table cells (
      id text primary key,
      tag text not null unique,
      name text not null unique,
      robot text not null,
      power_source text not null,
      scanner text not null,
      scanner_accuracy_mm real not null check (scanner_accuracy_mm >= 0),
      created_at text not null,
      version integer not null default 1
    ) STRICT`,
    `create table users (
      id text primary key,
      login text not null unique,
      name text not null,
      person_id text references people (id),
      password_hash text not null,
      failed_sign_ins integer not null default 0,
      wait_until text,
      disabled_at text,
      created_at text not null,
      version integer not null default 1
    ) STRICT`,
    `create index users_person on users (person_id)`,
    `create table user_roles (
      user_id text not null references users (id),
      role text not null check (role in
        ('administrator', 'coordinator', 'operator', 'inspector', 'quality', 'auditor', 'integrator')),
      primary key (user_id, role)
    ) STRICT`,
    `create table refresh_tokens (
      id text primary key,
      user_id text not null references users (id),
      family_id text not null,
      token_hash text not null unique,
      created_at text not null,
      expires_at text not null,
      used_at text,
      revoked_at text
    ) STRICT`,
    `create index refresh_tokens_family on refresh_tokens (family_id)`,
    `create index refresh_tokens_user on refresh_tokens (user_id)`,
    `create table api_keys (
      id text primary key,
      name text not null,
      prefix text not null,
      key_hash text not null unique,
      scopes text not null check (json_valid(scopes)),
      cell_id text references cells (id),
      created_at text not null,
      last_used_at text,
      revoked_at text
    ) STRICT`,
    `create index api_keys_cell on api_keys (cell_id)`,
  ]);
}
