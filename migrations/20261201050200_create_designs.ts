import type { Knex } from "knex";
import { run } from "./sql.ts";

export { down } from "./sql.ts";

/** What is to be made and how: procedures, drawings and model seams. */
export function up(knex: Knex): Promise<void> {
  return run(knex, [
    `create table procedures (
      id text primary key,
      number text not null,
      revision text not null,
      title text not null,
      process text not null,
      position text not null,
      ranges text not null check (json_valid(ranges)),
      status text not null check (status in ('draft', 'approved', 'withdrawn')),
      created_at text not null,
      version integer not null default 1,
      unique (number, revision)
    ) STRICT`,
    `create table drawings (
      id text primary key,
      number text not null,
      revision text not null,
      title text not null,
      status text not null check (status in ('draft', 'current', 'superseded')),
      created_at text not null,
      version integer not null default 1,
      unique (number, revision)
    ) STRICT`,
    `create table model_seams (
      id text primary key,
      drawing_id text not null references drawings (id),
      number text not null,
      sequence integer not null check (sequence > 0),
      joint_type text not null,
      length_mm real not null check (length_mm > 0),
      weld_size_mm real not null check (weld_size_mm > 0),
      quality_level text not null check (quality_level in ('B', 'C', 'D')),
      procedure_id text references procedures (id),
      scan_rule text not null check (scan_rule in ('always', 'sample', 'never')),
      model text not null check (json_valid(model)),
      limits text not null check (json_valid(limits)),
      created_at text not null,
      version integer not null default 1,
      unique (drawing_id, number)
    ) STRICT`,
    `create index model_seams_sequence on model_seams (drawing_id, sequence)`,
    `create index model_seams_procedure on model_seams (procedure_id)`,
  ]);
}
