import type { QueryInput } from "@beadroll/domain/contract/contract";
import { getProcedure, listProcedures } from "@beadroll/domain/contract/procedures.contract";
import { infiniteQueryOptions, queryOptions } from "@tanstack/react-query";
import { api, FIRST_PAGE } from "../../app/client.ts";

/** Which procedures a list shows. */
export type ProcedureFilter = Omit<NonNullable<QueryInput<typeof listProcedures>>, "cursor" | "limit">;

/** Query keys and fetchers of procedures. */
export const procedureQueries = {
  all: () => ["procedures"] as const,
  list: (filter: ProcedureFilter) =>
    infiniteQueryOptions({
      queryKey: ["procedures", "list", filter],
      queryFn: ({ pageParam, signal }) =>
        api.call(listProcedures, {
          query: { ...filter, ...(pageParam !== null && { cursor: pageParam }) },
          signal,
        }),
      initialPageParam: FIRST_PAGE,
      getNextPageParam: (page) => page.next_cursor,
    }),
  one: (id: string) =>
    queryOptions({
      queryKey: ["procedures", "one", id],
      queryFn: ({ signal }) => api.call(getProcedure, { params: { id }, signal }),
    }),
};
