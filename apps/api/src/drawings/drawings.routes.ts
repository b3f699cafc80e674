import * as contracts from "@beadroll/domain/contract/drawings.contract";
import { changeContext, type Deps } from "../deps.ts";
import { type Route, route } from "../http/route.ts";
import { listDrawings, readDrawingPage, readModelSeam, readSeamModel } from "./drawings.read.ts";
import { createDrawing, createModelSeam, patchDrawing, patchModelSeam } from "./drawings.service.ts";

/** Drawings and their model seams. */
export function drawingRoutes(deps: Deps): Route[] {
  const { reader } = deps.db;
  return [
    route(contracts.listDrawings, ({ query }) => listDrawings(reader, query)),
    route(contracts.createDrawing, (input) => createDrawing(changeContext(deps, input), input.body)),
    route(contracts.getDrawing, ({ params }) => readDrawingPage(reader, params.id)),
    route(contracts.patchDrawing, (input) =>
      patchDrawing(changeContext(deps, input), input.params.id, input.body, input.seen_version),
    ),
    route(contracts.createModelSeam, (input) =>
      createModelSeam(changeContext(deps, input), input.params.id, input.body),
    ),
    route(contracts.getModelSeam, ({ params }) => readModelSeam(reader, params.id)),
    route(contracts.getSeamModel, ({ params }) => readSeamModel(reader, params.id)),
    route(contracts.patchModelSeam, (input) =>
      patchModelSeam(changeContext(deps, input), input.params.id, input.body, input.seen_version),
    ),
  ];
}
