import type { QueryInput } from "@beadroll/domain/contract/contract";
import { getDrawing, listDrawings } from "@beadroll/domain/contract/drawings.contract";
import { infiniteQueryOptions, queryOptions } from "@tanstack/react-query";
import { api, FIRST_PAGE } from "../../app/client.ts";

/** Which drawings a list shows. */
export type DrawingFilter = Omit<NonNullable<QueryInput<typeof listDrawings>>, "cursor" | "limit">;

/** Query keys and fetchers of drawings. */
export const drawingQueries = {
  all: () => ["drawings"] as const,
  list: (filter: DrawingFilter) =>
    infiniteQueryOptions({
      queryKey: ["drawings", "list", filter],
      queryFn: ({ pageParam, signal }) =>
        api.call(listDrawings, {
          query: { ...filter, ...(pageParam !== null && { cursor: pageParam }) },
          signal,
        }),
      initialPageParam: FIRST_PAGE,
      getNextPageParam: (page) => page.next_cursor,
    }),
  one: (id: string) =>
    queryOptions({
      queryKey: ["drawings", "one", id],
      queryFn: ({ signal }) => api.call(getDrawing, { params: { id }, signal }),
    }),
};
