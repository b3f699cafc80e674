import { createProcedure, patchProcedure } from "@beadroll/domain/contract/procedures.contract";
import type { Procedure, ProcedureCreate, ProcedurePatch } from "@beadroll/domain/schemas/procedure";
import { useMutation, useQueryClient } from "@tanstack/react-query";
import { api } from "../../app/client.ts";
import { procedureQueries } from "./procedures.queries.ts";

/** Records a procedure as a draft. */
export function useCreateProcedure() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: ProcedureCreate) => api.call(createProcedure, { body }),
    onSettled: () => cache.invalidateQueries({ queryKey: procedureQueries.all() }),
  });
}

/** Changes a procedure as it was seen; the page is refreshed also when somebody else was first. */
export function usePatchProcedure(procedure: Procedure) {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: ProcedurePatch) =>
      api.call(patchProcedure, { params: { id: procedure.id }, body, seen_version: procedure.version }),
    onSettled: () => cache.invalidateQueries({ queryKey: procedureQueries.all() }),
  });
}
