import * as contracts from "@beadroll/domain/contract/procedures.contract";
import { changeContext, type Deps } from "../deps.ts";
import { type Route, route } from "../http/route.ts";
import { createProcedure, listProcedures, patchProcedure, readProcedure } from "./procedures.service.ts";

/** Welding procedures. */
export function procedureRoutes(deps: Deps): Route[] {
  return [
    route(contracts.listProcedures, ({ query }) => listProcedures(deps.db.reader, query)),
    route(contracts.createProcedure, (input) => createProcedure(changeContext(deps, input), input.body)),
    route(contracts.getProcedure, ({ params }) => readProcedure(deps.db.reader, params.id)),
    route(contracts.patchProcedure, (input) =>
      patchProcedure(
        changeContext(deps, { caller: input.caller, once: null }),
        input.params.id,
        input.body,
        input.seen_version,
      ),
    ),
  ];
}
