import type { Piece, WentIn } from "@beadroll/domain/schemas/part";
import type { Knex } from "knex";

const SLOT_ROLES: Readonly<Record<string, string>> = { wire: "Wire", gas: "Gas", flux: "Flux" };

interface ConsumableRow {
  readonly slot: string;
  readonly number: string;
  readonly grade: string;
  readonly tag: string;
  readonly seam_count: number;
}

async function readConsumables(db: Knex, partId: string): Promise<WentIn[]> {
  const rows: ConsumableRow[] = await db("seams")
    .join("passes", "passes.seam_id", "seams.id")
    .join("mounts", "mounts.cell_id", "passes.cell_id")
    .join("lots", "lots.id", "mounts.lot_id")
    .where({ "seams.part_id": partId })
    .whereRaw("mounts.from_at < passes.arc_to_at and coalesce(mounts.to_at, '9999') > passes.arc_from_at")
    .groupBy("mounts.slot", "lots.id")
    .orderByRaw("mounts.slot desc, lots.number")
    .select(
      "mounts.slot",
      "lots.number",
      "lots.grade",
      "lots.tag",
      db.raw("count(distinct seams.id) as seam_count"),
    );
  return rows.map(({ slot, number, grade, tag, seam_count }) => ({
    role: SLOT_ROLES[slot] ?? slot,
    name: number,
    detail: grade,
    tag,
    seam_count,
  }));
}

interface ProcedureRow {
  readonly number: string;
  readonly revision: string;
  readonly title: string;
  readonly seam_count: number;
}

async function readProcedures(db: Knex, partId: string): Promise<WentIn[]> {
  const rows: ProcedureRow[] = await db("seams")
    .join("passes", "passes.seam_id", "seams.id")
    .join("procedures", "procedures.id", "passes.procedure_id")
    .where({ "seams.part_id": partId })
    .groupBy("procedures.id")
    .orderBy("procedures.number")
    .select(
      "procedures.number",
      "procedures.revision",
      "procedures.title",
      db.raw("count(distinct seams.id) as seam_count"),
    );
  return rows.map(({ number, revision, title, seam_count }) => ({
    role: "Procedure",
    name: `${number} rev ${revision}`,
    detail: title,
    tag: null,
    seam_count,
  }));
}

interface OperatorRow {
  readonly name: string;
  readonly tag: string;
  readonly seam_count: number;
  readonly unqualified: number;
  readonly valid_until: string | null;
}

/** Operators, with the earliest end of the qualifications they welded under, or how many passes had none. */
async function readOperators(db: Knex, partId: string): Promise<WentIn[]> {
  const rows: OperatorRow[] = await db.raw(
    `select name, tag, count(distinct seam_id) as seam_count, min(valid_until) as valid_until,
       sum(valid_until is null) as unqualified
     from (
       select people.name, people.tag, passes.seam_id,
         (select max(qualifications.valid_until) from qualifications
           where qualifications.person_id = people.id and qualifications.process = procedures.process
             and qualifications.issued_on <= substr(passes.arc_to_at, 1, 10)
             and qualifications.valid_until >= substr(passes.arc_to_at, 1, 10)) as valid_until
       from seams
         join passes on passes.seam_id = seams.id
         join people on people.id = passes.operator_id
         left join procedures on procedures.id = passes.procedure_id
       where seams.part_id = ?)
     group by tag, name order by name`,
    [partId],
  );
  return rows.map(({ name, tag, seam_count, unqualified, valid_until }) => ({
    role: "Operator",
    name,
    detail:
      unqualified > 0 ? `${unqualified} passes without a valid qualification` : `valid to ${valid_until}`,
    tag,
    seam_count,
  }));
}

/** Everything that went into a part: pieces, consumables by what was mounted, procedures and operators. */
export async function readWentIn(
  db: Knex,
  partId: string,
  known: { readonly pieces: readonly Piece[]; readonly seam_count: number },
): Promise<WentIn[]> {
  const inForce = known.pieces.filter((piece) => piece.to_at === null);
  const pieces = inForce.map((piece) => ({
    role: piece.position,
    name: piece.lot_number,
    detail: piece.grade,
    tag: piece.lot_tag,
    seam_count: known.seam_count,
  }));
  const consumables = await readConsumables(db, partId);
  const procedures = await readProcedures(db, partId);
  return [...pieces, ...consumables, ...procedures, ...(await readOperators(db, partId))];
}
