import knexModule, { type Knex } from "knex";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { migrationSource } from "./list.ts";

let db: Knex;
beforeAll(async () => {
  db = knexModule({
    client: "better-sqlite3",
    connection: { filename: ":memory:" },
    useNullAsDefault: true,
    // A refused rollback is what the test wants; Knex need not print it.
    log: { warn: () => undefined, error: () => undefined },
  });
  await db.migrate.latest({ migrationSource });
});
afterAll(() => db.destroy());

const schema = async (): Promise<string> => {
  const rows: { sql: string }[] = await db("sqlite_master")
    .whereNotNull("sql")
    .whereNot("name", "like", "knex_%")
    .whereNot("name", "like", "sqlite_%")
    .orderBy(["type", "name"])
    .select("sql");
  return `${rows.map((row) => row.sql.replaceAll(/\s+/g, " ").trim()).join(";\n")};\n`;
};

describe("the migrations", () => {
  it("lead to the schema that is written down", async () => {
    await expect(await schema()).toMatchFileSnapshot("schema.sql");
  });

  it("only go forward", async () => {
    await expect(db.migrate.rollback({ migrationSource }, true)).rejects.toThrow("only go forward");
  });

  it("index every foreign key, so that no link is looked up by reading a table", async () => {
    const tables: { name: string }[] = await db("sqlite_master")
      .where({ type: "table" })
      .whereNot("name", "like", "knex_%");
    const bare: string[] = [];
    for (const { name } of tables) {
      const keys: { from: string }[] = await db.raw(`pragma foreign_key_list('${name}')`);
      const indexes: { name: string }[] = await db.raw(`pragma index_list('${name}')`);
      const first = new Set<string>();
      for (const index of indexes) {
        const columns: { seqno: number; name: string }[] = await db.raw(`pragma index_info('${index.name}')`);
        for (const column of columns) if (column.seqno === 0) first.add(column.name);
      }
      for (const key of keys) if (!first.has(key.from)) bare.push(`${name}.${key.from}`);
    }
    expect(bare).toEqual([]);
  });
});
