import type { QueryInput } from "@beadroll/domain/contract/contract";
import { getLot, listLots } from "@beadroll/domain/contract/lots.contract";
import { infiniteQueryOptions, queryOptions } from "@tanstack/react-query";
import { api, FIRST_PAGE } from "../../app/client.ts";

/** Which lots a list shows. */
export type LotFilter = Omit<NonNullable<QueryInput<typeof listLots>>, "cursor" | "limit">;

/** Query keys and fetchers of lots. */
export const lotQueries = {
  all: () => ["lots"] as const,
  list: (filter: LotFilter) =>
    infiniteQueryOptions({
      queryKey: ["lots", "list", filter],
      queryFn: ({ pageParam, signal }) =>
        api.call(listLots, {
          query: { ...filter, ...(pageParam !== null && { cursor: pageParam }) },
          signal,
        }),
      initialPageParam: FIRST_PAGE,
      getNextPageParam: (page) => page.next_cursor,
    }),
  one: (tag: string) =>
    queryOptions({
      queryKey: ["lots", "one", tag],
      queryFn: ({ signal }) => api.call(getLot, { params: { tag }, signal }),
    }),
};
