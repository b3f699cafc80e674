import * as contracts from "@beadroll/domain/contract/seams.contract";
import type { Deps } from "../deps.ts";
import { type Route, route } from "../http/route.ts";
import { listSeams, readSeamPage } from "./seams.read.ts";

/** Seams over all parts, and one seam's whole record. */
export function seamRoutes(deps: Deps): Route[] {
  const { reader } = deps.db;
  return [
    route(contracts.listSeams, ({ query }) => listSeams(reader, query)),
    route(contracts.getSeam, ({ params }) => readSeamPage(reader, params.tag)),
  ];
}
