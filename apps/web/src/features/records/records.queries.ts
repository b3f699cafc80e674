import type { QueryInput } from "@beadroll/domain/contract/contract";
import { listLedger } from "@beadroll/domain/contract/records.contract";
import { infiniteQueryOptions } from "@tanstack/react-query";
import { api, FIRST_PAGE } from "../../app/client.ts";

/** Which entries a list shows. */
export type LedgerFilter = Omit<NonNullable<QueryInput<typeof listLedger>>, "cursor" | "limit">;

/** Query keys and fetchers of the ledger's entries. */
export const ledgerQueries = {
  list: (filter: LedgerFilter) =>
    infiniteQueryOptions({
      queryKey: ["ledger-entries", "pages", filter],
      queryFn: ({ pageParam, signal }) =>
        api.call(listLedger, {
          query: { ...filter, limit: 100, ...(pageParam !== null && { cursor: pageParam }) },
          signal,
        }),
      initialPageParam: FIRST_PAGE,
      getNextPageParam: (page) => page.next_cursor,
    }),
};
