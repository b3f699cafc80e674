import * as contracts from "@beadroll/domain/contract/seams.contract";
import { changeContext, type Deps } from "../deps.ts";
import { type Route, route } from "../http/route.ts";
import { recordInspection } from "./inspections.service.ts";

/** Inspections of seams. */
export function inspectionRoutes(deps: Deps): Route[] {
  return [
    route(contracts.recordInspection, (input) =>
      recordInspection(changeContext(deps, input), input.params.tag, input.body),
    ),
  ];
}
