import type { Knex } from "knex";

/**
 * Runs statements one by one, as written. The SQL is spelled out because Knex's schema builder rebuilds
 * tables on SQLite, which drops triggers; STRICT is SQLite's own and is left out elsewhere.
 */
export async function run(knex: Knex, statements: readonly string[]): Promise<void> {
  const isSqlite = knex.client.config.client === "better-sqlite3";
  for (const statement of statements) {
    await knex.raw(
      isSqlite ? statement : statement.replaceAll(/\) STRICT\b/g, ")").replaceAll("BLOB", "BYTEA"),
    );
  }
}

/** Migrations only go forward; to go back, restore a backup. */
export function down(): Promise<void> {
  return Promise.reject(new Error("migrations only go forward: restore a backup instead"));
}
