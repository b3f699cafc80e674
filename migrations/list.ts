import type { Knex } from "knex";
import * as ledgerAndFiles from "./20261201050000_create_ledger_and_files.ts";
import * as peopleAndAccess from "./20261201050100_create_people_and_access.ts";
import * as designs from "./20261201050200_create_designs.ts";
import * as partsAndLots from "./20261201050300_create_parts_and_lots.ts";
import * as evidence from "./20261201050400_create_evidence.ts";

/** Every migration in order, by name without extension: source and bundle give the same names to Knex. */
const MIGRATIONS: ReadonlyArray<readonly [name: string, migration: Knex.Migration]> = [
  ["20261201050000_create_ledger_and_files", ledgerAndFiles],
  ["20261201050100_create_people_and_access", peopleAndAccess],
  ["20261201050200_create_designs", designs],
  ["20261201050300_create_parts_and_lots", partsAndLots],
  ["20261201050400_create_evidence", evidence],
];

/** Knex's migration source over the list above. */
export const migrationSource: Knex.MigrationSource<string> = {
  getMigrations: () => Promise.resolve(MIGRATIONS.map(([name]) => name)),
  getMigrationName: (name) => name,
  getMigration: (name) => {
    const found = MIGRATIONS.find(([candidate]) => candidate === name);
    return found ? Promise.resolve(found[1]) : Promise.reject(new Error(`no migration named ${name}`));
  },
};
