import { recordInspection } from "@beadroll/domain/contract/seams.contract";
import type { InspectionCreate } from "@beadroll/domain/schemas/inspection";
import { useMutation, useQueryClient } from "@tanstack/react-query";
import { api } from "../../app/client.ts";
import { seamQueries } from "./seams.queries.ts";

/** Records an inspection of a seam. */
export function useRecordInspection(tag: string) {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: InspectionCreate) => api.call(recordInspection, { params: { tag }, body }),
    onSettled: () => cache.invalidateQueries({ queryKey: seamQueries.all() }),
  });
}
