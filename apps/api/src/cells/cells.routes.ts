import * as contracts from "@beadroll/domain/contract/cells.contract";
import { changeContext, type Deps } from "../deps.ts";
import { type Route, route } from "../http/route.ts";
import { createCell, listCells, listMounts, mountLot, readCell } from "./cells.service.ts";
import { readFloor } from "./floor.read.ts";

/** Cells, what is mounted on them, and the floor. */
export function cellRoutes(deps: Deps): Route[] {
  const { reader } = deps.db;
  return [
    route(contracts.getFloor, () => readFloor(reader, deps.now())),
    route(contracts.listCells, ({ query }) => listCells(reader, query)),
    route(contracts.createCell, (input) => createCell(changeContext(deps, input), input.body)),
    route(contracts.getCell, ({ params }) => readCell(reader, params.tag)),
    route(contracts.listMounts, ({ query }) => listMounts(reader, query)),
    route(contracts.mountLot, (input) => mountLot(changeContext(deps, input), input.body)),
  ];
}
