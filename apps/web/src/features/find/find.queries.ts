import { find } from "@beadroll/domain/contract/records.contract";
import { queryOptions } from "@tanstack/react-query";
import { api } from "../../app/client.ts";

/** What a search found, best first. */
export const findQuery = (q: string) =>
  queryOptions({
    queryKey: ["find", q],
    queryFn: ({ signal }) => api.call(find, { query: { q }, signal }),
    staleTime: 10_000,
  });
