import { createHash, randomBytes } from "node:crypto";
import { canonicalJson, type JsonValue } from "@beadroll/domain/ledger/canonical-json";
import { entryLeaf, type LedgerEntryInput } from "@beadroll/domain/ledger/entry";
import { mintTag, type Tag, type TagKind } from "@beadroll/domain/tags/tag";
import type { Knex } from "knex";
import { v7 as uuidv7 } from "uuid";
import { actorName, type Caller } from "../auth/caller.ts";
import type { Once } from "../http/idempotency.ts";

/** A value a column can hold. */
export type Cell = string | number | null | Uint8Array;
export type Row = Readonly<Record<string, Cell>>;

/** Columns whose values never go into the ledger, which is read by more people than may know them. */
const WITHHELD = new Set(["password_hash", "key_hash", "token_hash"]);

interface Write {
  readonly table: string;
  readonly key: Row;
  readonly before?: Record<string, Cell>;
  readonly after: Record<string, Cell>;
}

const sha256 = (bytes: Uint8Array): Uint8Array => createHash("sha256").update(bytes).digest();
const hex = (bytes: Uint8Array): string => Buffer.from(bytes).toString("hex");

/** A row as the ledger shows it: blobs by their digest, secrets withheld. */
function shown(row: Row): Record<string, Cell> {
  return Object.fromEntries(
    Object.entries(row).map(([column, value]) => {
      if (WITHHELD.has(column)) return [column, "[withheld]"];
      return [column, value instanceof Uint8Array ? `sha256:${hex(sha256(value))}` : value];
    }),
  );
}

/**
 * The only way to write records: made by {@link change}, taken by every store. What goes through it stands in
 * the ledger entry of the change; there is no second way.
 */
export class ChangeTrx {
  readonly #writes: Write[] = [];

  /** For reading inside the transaction. */
  readonly read: Knex.Transaction;
  /** The entry's place in the ledger, known before it is written. */
  readonly seq: number;
  /** The change's instant, RFC 3339 in UTC. */
  readonly at: string;

  constructor(read: Knex.Transaction, seq: number, at: string) {
    this.read = read;
    this.seq = seq;
    this.at = at;
  }

  /** A new identifier (UUIDv7). */
  newId(): string {
    return uuidv7();
  }

  /** A new tag. Forty random bits: the table's unique index catches the improbable twin. */
  newTag(kind: TagKind): Tag {
    return mintTag(kind, randomBytes(8));
  }

  async insert(table: string, row: Row): Promise<void> {
    await this.read(table).insert(row);
    this.#writes.push({ table, key: { id: row["id"] ?? null }, after: shown(row) });
  }

  /** Writes columns of the rows that match the key, with what stood there before. */
  async update(table: string, key: Row, after: Row): Promise<void> {
    const rows: Row[] = await this.read(table).where(key).select(Object.keys(after));
    await this.read(table).where(key).update(after);
    for (const before of rows)
      this.#writes.push({ table, key: shown(key), before: shown(before), after: shown(after) });
  }

  /**
   * Writes columns that are worked out from facts and can be worked out again: a seam's state, its strip.
   * They are not facts, so they do not stand in the ledger.
   */
  async derive(table: string, id: string, columns: Row): Promise<void> {
    await this.read(table).where({ id }).update(columns);
  }

  get writes(): readonly Write[] {
    return this.#writes;
  }
}

/** What one change did: the answer to give, what it is about, and what else to say in the ledger. */
export interface Done<T> {
  readonly value: T;
  readonly subjects: readonly string[];
  /** Facts worth reading at a glance, beside the rows written. */
  readonly facts?: Readonly<Record<string, unknown>>;
  /** What a repeat of the same request is answered from; the value itself if absent. */
  readonly remember?: unknown;
}

/** Who changes, when, and under which idempotency key. */
export interface ChangeContext {
  readonly writer: Knex;
  readonly now: () => Date;
  readonly caller: Caller;
  readonly once: Once | null;
}

async function nextSeq(trx: Knex.Transaction): Promise<number> {
  const last: { seq: number } | undefined = await trx("ledger_entries").orderBy("seq", "desc").first("seq");
  return last === undefined ? 0 : last.seq + 1;
}

async function appendEntry(
  trx: ChangeTrx,
  caller: Caller,
  action: string,
  done: Done<unknown>,
): Promise<void> {
  const subjects = [...new Set(done.subjects)];
  // Through JSON once, so that what is hashed is what can be read back.
  const body: Record<string, JsonValue> = JSON.parse(JSON.stringify({ ...done.facts, writes: trx.writes }));
  const entry: LedgerEntryInput = {
    seq: trx.seq,
    at: trx.at,
    actor: actorName(caller),
    action,
    subjects,
    body,
  };
  await trx.read("ledger_entries").insert({
    seq: entry.seq,
    at: entry.at,
    actor: entry.actor,
    action: entry.action,
    subjects: canonicalJson(entry.subjects),
    body: canonicalJson(entry.body),
    leaf_hash: Buffer.from(entryLeaf(entry, sha256)),
  });
  for (const subject of subjects) await trx.read("ledger_subjects").insert({ subject, seq: trx.seq });
}

/**
 * Makes one change: one transaction that writes the rows and the ledger entry, and the remembered answer when the
 * request carries an idempotency key. Answers after the commit, which is on disk (synchronous=FULL).
 */
export function change<T>(
  context: ChangeContext,
  action: string,
  work: (trx: ChangeTrx) => Promise<Done<T>>,
): Promise<T> {
  return context.writer.transaction(async (raw) => {
    const trx = new ChangeTrx(raw, await nextSeq(raw), context.now().toISOString());
    const done = await work(trx);
    await appendEntry(trx, context.caller, action, done);
    if (context.once) await context.once.remember(raw, trx.at, done.remember ?? done.value);
    return done.value;
  });
}
