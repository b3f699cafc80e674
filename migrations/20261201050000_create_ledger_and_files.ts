import type { Knex } from "knex";
import { run } from "./sql.ts";

export { down } from "./sql.ts";

/** The append-only ledger, stored files, durable jobs and remembered answers. */
export function up(knex: Knex): Promise<void> {
  return run(knex, [
    `create table ledger_entries (
      seq integer primary key,
      at text not null,
      actor text not null,
      action text not null,
      subjects text not null check (json_valid(subjects)),
      body text not null check (json_valid(body)),
      leaf_hash blob not null check (length(leaf_hash) = 32)
    ) STRICT`,
    `create index ledger_entries_action on ledger_entries (action, seq)`,
    `create trigger ledger_entries_no_update before update on ledger_entries
      begin select raise(abort, 'the ledger is append-only'); end`,
    `create trigger ledger_entries_no_delete before delete on ledger_entries
      begin select raise(abort, 'the ledger is append-only'); end`,
    `create table ledger_subjects (
      subject text not null,
      seq integer not null references ledger_entries (seq),
      primary key (subject, seq)
    ) STRICT`,
    `create index ledger_subjects_seq on ledger_subjects (seq)`,
    `create table files (
      digest text primary key check (length(digest) = 64),
      name text not null,
      media_type text not null,
      size integer not null check (size > 0),
      created_at text not null,
      created_by text not null
    ) STRICT`,
    `create table jobs (
      id text primary key,
      kind text not null,
      payload text not null check (json_valid(payload)),
      state text not null check (state in ('waiting', 'leased', 'done', 'dead')),
      run_at text not null,
      lease_until text,
      attempts integer not null default 0 check (attempts >= 0),
      last_error text,
      created_at text not null,
      done_at text
    ) STRICT`,
    `create index jobs_due on jobs (state, run_at)`,
    `create table mails (
      id text primary key,
      job_id text not null references jobs (id),
      recipient text not null,
      subject text not null,
      body text not null,
      created_at text not null,
      sent_at text
    ) STRICT`,
    `create index mails_job on mails (job_id)`,
    `create index mails_created on mails (created_at)`,
    `create table idempotency_keys (
      actor text not null,
      key text not null,
      operation text not null,
      request_digest text not null check (length(request_digest) = 64),
      status integer not null,
      answer text not null,
      created_at text not null,
      primary key (actor, key)
    ) STRICT`,
    `create index idempotency_keys_created on idempotency_keys (created_at)`,
  ]);
}
