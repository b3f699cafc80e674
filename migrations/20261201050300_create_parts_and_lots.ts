import type { Knex } from "knex";
import { run } from "./sql.ts";

export { down } from "./sql.ts";

/** Parts with their seams, lots with their certificates, and the links between them. */
export function up(knex: Knex): Promise<void> {
  return run(knex, [
    `create table lots (
      id text primary key,
      tag text not null unique,
      kind text not null check (kind in ('plate', 'section', 'tube', 'wire', 'gas', 'flux')),
      number text not null,
      supplier text not null,
      grade text not null,
      dimension text,
      thickness_mm real check (thickness_mm > 0),
      quantity real not null check (quantity > 0),
      unit text not null,
      received_on text not null,
      state text not null check (state in ('received', 'released', 'quarantined', 'used_up')),
      note text not null default '',
      created_at text not null,
      version integer not null default 1,
      unique (kind, number, supplier)
    ) STRICT`,
    `create index lots_number on lots (number)`,
    `create index lots_created on lots (created_at, id)`,
    `create index lots_kind on lots (kind, created_at, id)`,
    `create index lots_state on lots (state, created_at, id)`,
    `create table certificates (
      id text primary key,
      lot_id text not null references lots (id),
      type text not null check (type in ('2.1', '2.2', '3.1', '3.2')),
      number text not null,
      issuer text not null,
      issued_on text not null,
      chemistry text not null check (json_valid(chemistry)),
      mechanical text not null check (json_valid(mechanical)),
      file_digest text references files (digest),
      created_at text not null,
      unique (lot_id, number)
    ) STRICT`,
    `create index certificates_file on certificates (file_digest)`,
    `create table parts (
      id text primary key,
      tag text not null unique,
      drawing_id text not null references drawings (id),
      serial text not null,
      order_no text,
      parent_part_id text references parts (id),
      created_at text not null,
      version integer not null default 1,
      unique (drawing_id, serial)
    ) STRICT`,
    `create index parts_created on parts (created_at, id)`,
    `create index parts_serial on parts (serial, id)`,
    `create index parts_order on parts (order_no, created_at)`,
    `create index parts_drawing_created on parts (drawing_id, created_at, id)`,
    `create index parts_parent on parts (parent_part_id)`,
    `create table pieces (
      id text primary key,
      part_id text not null references parts (id),
      lot_id text not null references lots (id),
      position text not null,
      from_at text not null,
      to_at text check (to_at >= from_at)
    ) STRICT`,
    `create unique index pieces_in_force on pieces (part_id, position) where to_at is null`,
    `create index pieces_part on pieces (part_id, from_at)`,
    `create index pieces_lot on pieces (lot_id, from_at)`,
    `create table seams (
      id text primary key,
      tag text not null unique,
      part_id text not null references parts (id),
      model_seam_id text not null references model_seams (id),
      attempt integer not null default 1 check (attempt > 0),
      state text not null check (state in
        ('planned', 'held', 'clear', 'welded', 'accepted', 'rejected', 'repair', 'released')),
      verdict text check (verdict in ('within', 'adapt', 'hold')),
      largest_mm real,
      heat_input_kj_mm real,
      strip blob,
      changed_at text not null,
      unique (part_id, model_seam_id)
    ) STRICT`,
    `create index seams_model_seam on seams (model_seam_id, changed_at)`,
    `create index seams_state on seams (state, changed_at, id)`,
    `create index seams_verdict on seams (verdict, changed_at, id)`,
    `create index seams_changed on seams (changed_at, id)`,
    `create index seams_part_state on seams (part_id, state)`,
  ]);
}
