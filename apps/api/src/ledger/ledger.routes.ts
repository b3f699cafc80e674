import * as contracts from "@beadroll/domain/contract/records.contract";
import type { Deps } from "../deps.ts";
import { type Route, route } from "../http/route.ts";
import { listLedger, readLedgerEntry } from "./ledger.read.ts";

/** The ledger's entries. */
export function ledgerRoutes(deps: Deps): Route[] {
  const { reader } = deps.db;
  return [
    route(contracts.listLedger, ({ query }) => listLedger(reader, query)),
    route(contracts.getLedgerEntry, ({ params }) => readLedgerEntry(reader, params.seq)),
  ];
}
