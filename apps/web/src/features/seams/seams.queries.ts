import { getSeamModel } from "@beadroll/domain/contract/drawings.contract";
import { listLedger } from "@beadroll/domain/contract/records.contract";
import { getScan, getSeam, getSection } from "@beadroll/domain/contract/seams.contract";
import { queryOptions } from "@tanstack/react-query";
import { api } from "../../app/client.ts";

/** What never changes once recorded may stay in the cache for as long as the page is open. */
const FOR_GOOD = Number.POSITIVE_INFINITY;
const LIVE_MS = 5000;
const NEWEST_ENTRIES = 20;

/** Query keys and fetchers of seams, as the API names them. */
export const seamQueries = {
  all: () => ["seams"] as const,
  one: (tag: string) =>
    queryOptions({
      queryKey: ["seams", "one", tag],
      queryFn: ({ signal }) => api.call(getSeam, { params: { tag }, signal }),
      refetchInterval: LIVE_MS,
    }),
  scan: (id: string) =>
    queryOptions({
      queryKey: ["scans", "one", id],
      queryFn: ({ signal }) => api.call(getScan, { params: { id }, signal }),
      staleTime: FOR_GOOD,
    }),
  section: (scanId: string, station_mm: number) =>
    queryOptions({
      queryKey: ["scans", "section", scanId, station_mm],
      queryFn: ({ signal }) =>
        api.call(getSection, { params: { id: scanId }, query: { station_mm }, signal }),
      staleTime: FOR_GOOD,
    }),
  model: (modelSeamId: string) =>
    queryOptions({
      queryKey: ["model-seams", "model", modelSeamId],
      queryFn: ({ signal }) => api.call(getSeamModel, { params: { id: modelSeamId }, signal }),
    }),
  ledger: (tag: string) =>
    queryOptions({
      queryKey: ["ledger-entries", "list", { subject: tag }],
      queryFn: ({ signal }) =>
        api.call(listLedger, { query: { subject: tag, limit: NEWEST_ENTRIES }, signal }),
    }),
};
