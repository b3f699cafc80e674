import type { Knex } from "knex";
import { run } from "./sql.ts";

export { down } from "./sql.ts";

/** What happened to seams: mounts on cells, scans, passes and inspections. */
export function up(knex: Knex): Promise<void> {
  return run(knex, [
    `create table mounts (
      id text primary key,
      cell_id text not null references cells (id),
      slot text not null check (slot in ('wire', 'gas', 'flux')),
      lot_id text not null references lots (id),
      from_at text not null,
      to_at text check (to_at >= from_at),
      created_by text not null
    ) STRICT`,
    `create unique index mounts_in_force on mounts (cell_id, slot) where to_at is null`,
    `create index mounts_cell on mounts (cell_id, slot, from_at)`,
    `create index mounts_lot on mounts (lot_id, from_at)`,
    `create index mounts_from on mounts (from_at, id)`,
    `create table scans (
      id text primary key,
      seam_id text not null references seams (id),
      attempt integer not null check (attempt > 0),
      stage text not null check (stage in ('fitup', 'bead')),
      verdict text not null check (verdict in ('within', 'adapt', 'hold')),
      points integer not null check (points > 0),
      file_name text not null,
      file_digest text not null references files (digest),
      poses_digest text references files (digest),
      units text not null check (units in ('mm', 'in', 'm')),
      limits text not null check (json_valid(limits)),
      engine text not null,
      summary text not null check (json_valid(summary)),
      stations blob not null,
      cell_id text references cells (id),
      taken_at text not null,
      received_at text not null,
      received_from text not null,
      ledger_seq integer not null references ledger_entries (seq) deferrable initially deferred
    ) STRICT`,
    `create unique index scans_content on scans (seam_id, attempt, stage, file_digest, coalesce(poses_digest, ''))`,
    `create index scans_seam on scans (seam_id, received_at)`,
    `create index scans_cell on scans (cell_id, received_at)`,
    `create index scans_file on scans (file_digest)`,
    `create index scans_poses on scans (poses_digest)`,
    `create index scans_ledger on scans (ledger_seq)`,
    `create table passes (
      id text primary key,
      seam_id text not null references seams (id),
      attempt integer not null check (attempt > 0),
      pass_number integer not null check (pass_number > 0),
      procedure_id text references procedures (id),
      operator_id text references people (id),
      cell_id text references cells (id),
      program text,
      file_name text not null,
      file_digest text not null references files (digest),
      started_at text not null,
      ended_at text not null check (ended_at >= started_at),
      arc_from_at text not null,
      arc_to_at text not null check (arc_to_at >= arc_from_at),
      heat_input_kj_mm real,
      result text not null check (json_valid(result)),
      received_at text not null,
      received_from text not null,
      ledger_seq integer not null references ledger_entries (seq) deferrable initially deferred,
      unique (seam_id, attempt, pass_number)
    ) STRICT`,
    `create unique index passes_content on passes (seam_id, attempt, file_digest)`,
    `create index passes_cell on passes (cell_id, arc_from_at)`,
    `create index passes_operator on passes (operator_id, arc_from_at)`,
    `create index passes_procedure on passes (procedure_id, arc_from_at)`,
    `create index passes_file on passes (file_digest)`,
    `create index passes_ledger on passes (ledger_seq)`,
    `create table inspections (
      id text primary key,
      seam_id text not null references seams (id),
      attempt integer not null check (attempt > 0),
      method text not null check (method in ('VT', 'PT', 'MT', 'RT', 'UT')),
      result text not null check (result in ('accepted', 'rejected')),
      note text not null,
      inspector_name text not null,
      inspector_user_id text references users (id),
      performed_at text not null,
      received_at text not null,
      ledger_seq integer not null references ledger_entries (seq) deferrable initially deferred
    ) STRICT`,
    `create index inspections_seam on inspections (seam_id, performed_at)`,
    `create index inspections_user on inspections (inspector_user_id)`,
    `create index inspections_ledger on inspections (ledger_seq)`,
  ]);
}
