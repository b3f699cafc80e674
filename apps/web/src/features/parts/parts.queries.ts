import type { QueryInput } from "@beadroll/domain/contract/contract";
import { getPart, listParts } from "@beadroll/domain/contract/parts.contract";
import { infiniteQueryOptions, queryOptions } from "@tanstack/react-query";
import { api, FIRST_PAGE } from "../../app/client.ts";

/** Which parts a list shows, and in which order. */
export type PartFilter = Omit<NonNullable<QueryInput<typeof listParts>>, "cursor" | "limit">;

/** A part being worked on changes while it is looked at. */
const LIVE_MS = 5000;

/** Query keys and fetchers of parts. */
export const partQueries = {
  all: () => ["parts"] as const,
  list: (filter: PartFilter) =>
    infiniteQueryOptions({
      queryKey: ["parts", "list", filter],
      queryFn: ({ pageParam, signal }) =>
        api.call(listParts, {
          query: { ...filter, ...(pageParam !== null && { cursor: pageParam }) },
          signal,
        }),
      initialPageParam: FIRST_PAGE,
      getNextPageParam: (page) => page.next_cursor,
    }),
  one: (tag: string) =>
    queryOptions({
      queryKey: ["parts", "one", tag],
      queryFn: ({ signal }) => api.call(getPart, { params: { tag }, signal }),
      refetchInterval: LIVE_MS,
    }),
};
