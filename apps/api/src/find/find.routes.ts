import * as contracts from "@beadroll/domain/contract/records.contract";
import type { Deps } from "../deps.ts";
import { type Route, route } from "../http/route.ts";
import { find, resolveTag } from "./find.read.ts";

/** Search, and what a tag is of. */
export function findRoutes(deps: Deps): Route[] {
  const { reader } = deps.db;
  return [
    route(contracts.find, async ({ query }) => ({ items: await find(reader, query.q) })),
    route(contracts.resolveTag, ({ params }) => resolveTag(reader, params.tag)),
  ];
}
