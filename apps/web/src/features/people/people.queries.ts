import { getPerson, listPeople } from "@beadroll/domain/contract/people.contract";
import { infiniteQueryOptions, queryOptions } from "@tanstack/react-query";
import { api, FIRST_PAGE } from "../../app/client.ts";

/** Query keys and fetchers of people. */
export const peopleQueries = {
  all: () => ["people"] as const,
  list: () =>
    infiniteQueryOptions({
      queryKey: ["people", "list", {}],
      queryFn: ({ pageParam, signal }) =>
        api.call(listPeople, { query: pageParam === null ? {} : { cursor: pageParam }, signal }),
      initialPageParam: FIRST_PAGE,
      getNextPageParam: (page) => page.next_cursor,
    }),
  one: (tag: string) =>
    queryOptions({
      queryKey: ["people", "one", tag],
      queryFn: ({ signal }) => api.call(getPerson, { params: { tag }, signal }),
    }),
};
