import { listCells } from "@beadroll/domain/contract/cells.contract";
import { listKeys, listUsers } from "@beadroll/domain/contract/users.contract";
import { queryOptions } from "@tanstack/react-query";
import { api } from "../../app/client.ts";

/** Accounts and keys of a shop are few: one page holds them. */
const ALL = { limit: 500 };

/** Query keys and fetchers of accounts and keys. */
export const userQueries = {
  users: () =>
    queryOptions({
      queryKey: ["users", "list", {}],
      queryFn: ({ signal }) => api.call(listUsers, { query: ALL, signal }),
    }),
  keys: () =>
    queryOptions({
      queryKey: ["keys", "list", {}],
      queryFn: ({ signal }) => api.call(listKeys, { query: ALL, signal }),
    }),
  cells: () =>
    queryOptions({
      queryKey: ["cells", "list", {}],
      queryFn: ({ signal }) => api.call(listCells, { query: ALL, signal }),
    }),
};
