import { migrationSource } from "@beadroll/migrations/list";
import knexModule, { type Knex } from "knex";

/** The two doors to the database: one connection that writes, and readers that never wait for it (WAL). */
export interface Database {
  readonly writer: Knex;
  readonly reader: Knex;
  close(): Promise<void>;
}

interface RawConnection {
  pragma(text: string): unknown;
}

function open(filename: string, readonly: boolean): Knex {
  return knexModule({
    client: "better-sqlite3",
    connection: { filename, options: { readonly } },
    useNullAsDefault: true,
    // One connection a door: better-sqlite3 is synchronous, more connections would only add locks.
    pool: {
      min: 1,
      max: 1,
      afterCreate: (connection: RawConnection, done: (error: Error | null) => void) => {
        for (const pragma of PRAGMAS) connection.pragma(pragma);
        done(null);
      },
    },
  });
}

const PRAGMAS = [
  "journal_mode = WAL",
  "synchronous = FULL",
  "foreign_keys = ON",
  "busy_timeout = 5000",
  "cache_size = -65536",
  "temp_store = MEMORY",
  "trusted_schema = OFF",
];

/** Opens the database, bringing its tables up to date first. */
export async function openDatabase(filename: string): Promise<Database> {
  const writer = open(filename, false);
  await writer.migrate.latest({ migrationSource });
  const reader = open(filename, true);
  return {
    writer,
    reader,
    close: async () => {
      await reader.destroy();
      await writer.destroy();
    },
  };
}
