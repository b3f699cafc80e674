import * as contracts from "@beadroll/domain/contract/lots.contract";
import { changeContext, type Deps } from "../deps.ts";
import { type Route, route } from "../http/route.ts";
import { listLots, readLotPage } from "./lots.read.ts";
import { addCertificate, createLot, patchLot } from "./lots.service.ts";

/** Lots and their certificates. */
export function lotRoutes(deps: Deps): Route[] {
  const { reader } = deps.db;
  return [
    route(contracts.listLots, ({ query }) => listLots(reader, query)),
    route(contracts.createLot, (input) => createLot(changeContext(deps, input), input.body)),
    route(contracts.getLot, ({ params }) => readLotPage(reader, params.tag)),
    route(contracts.patchLot, (input) =>
      patchLot(changeContext(deps, input), input.params.tag, input.body, input.seen_version),
    ),
    route(contracts.addCertificate, (input) =>
      addCertificate(changeContext(deps, input), input.params.tag, input.body),
    ),
  ];
}
