import * as contracts from "@beadroll/domain/contract/users.contract";
import { changeContext, type Deps } from "../deps.ts";
import { type Route, route } from "../http/route.ts";
import { createKey, createUser, listKeys, listUsers, revokeKey } from "./users.service.ts";

/** Accounts and machine keys. */
export function userRoutes(deps: Deps): Route[] {
  const { reader } = deps.db;
  return [
    route(contracts.listUsers, ({ query }) => listUsers(reader, query)),
    route(contracts.createUser, (input) => createUser(changeContext(deps, input), input.body)),
    route(contracts.listKeys, ({ query }) => listKeys(reader, query)),
    route(contracts.createKey, (input) => createKey(changeContext(deps, input), input.body)),
    route(contracts.revokeKey, (input) => revokeKey(changeContext(deps, input), input.params.id)),
  ];
}
