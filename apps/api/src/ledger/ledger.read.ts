import type { LedgerRecord } from "@beadroll/domain/schemas/ledger-record";
import type { Knex } from "knex";
import { type PageRequest, readPage } from "../db/keyset.ts";
import { type Page, pageOf } from "../db/page.ts";
import { refusal } from "../http/refusal.ts";

type EntryRow = Omit<LedgerRecord, "subjects" | "body" | "leaf_hash"> & {
  readonly subjects: string;
  readonly body: string;
  readonly leaf_hash: Buffer;
};

const COLUMNS = [
  "ledger_entries.seq",
  "ledger_entries.at",
  "ledger_entries.actor",
  "ledger_entries.action",
  "ledger_entries.subjects",
  "ledger_entries.body",
  "ledger_entries.leaf_hash",
];

const toRecord = (row: EntryRow): LedgerRecord => ({
  ...row,
  subjects: JSON.parse(row.subjects),
  body: JSON.parse(row.body),
  leaf_hash: row.leaf_hash.toString("hex"),
});

/** Most entries that a record's page names. */
const NAMED_MAX = 200;

/** Places in the ledger of the entries that name a subject, latest first. */
export async function readSeqsOf(db: Knex, subject: string): Promise<number[]> {
  return db("ledger_subjects").where({ subject }).orderBy("seq", "desc").limit(NAMED_MAX).pluck("seq");
}

/** An entry. @throws Refusal not-found */
export async function readLedgerEntry(db: Knex, seq: number): Promise<LedgerRecord> {
  const row: EntryRow | undefined = await db("ledger_entries").where({ seq }).first(COLUMNS);
  if (row === undefined) throw refusal("not-found", `The ledger has no entry ${seq}.`);
  return toRecord(row);
}

/** Entries, latest first. */
export async function listLedger(
  db: Knex,
  filter: PageRequest & { readonly subject?: string | undefined; readonly action?: string | undefined },
): Promise<Page<LedgerRecord>> {
  const query = db("ledger_entries").select(COLUMNS);
  if (filter.subject)
    query
      .join("ledger_subjects", "ledger_subjects.seq", "ledger_entries.seq")
      .where({ "ledger_subjects.subject": filter.subject });
  if (filter.action) query.where({ "ledger_entries.action": filter.action });
  const page = await readPage<EntryRow>(query, { columns: ["ledger_entries.seq"], descending: true }, filter);
  return pageOf(page, toRecord);
}
