import { addPiece, createPart } from "@beadroll/domain/contract/parts.contract";
import type { PartCreate, PieceCreate } from "@beadroll/domain/schemas/part";
import { useMutation, useQueryClient } from "@tanstack/react-query";
import { api } from "../../app/client.ts";
import { partQueries } from "./parts.queries.ts";

/** Starts a part. */
export function useCreatePart() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: PartCreate) => api.call(createPart, { body }),
    onSettled: () => cache.invalidateQueries({ queryKey: partQueries.all() }),
  });
}

/** Builds a piece into a part. */
export function useAddPiece(tag: string) {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: PieceCreate) => api.call(addPiece, { params: { tag }, body }),
    onSettled: () => cache.invalidateQueries({ queryKey: partQueries.all() }),
  });
}
