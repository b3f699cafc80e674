import { createDrawing, patchDrawing, patchModelSeam } from "@beadroll/domain/contract/drawings.contract";
import type {
  Drawing,
  DrawingCreate,
  DrawingPatch,
  ModelSeam,
  ModelSeamPatch,
} from "@beadroll/domain/schemas/drawing";
import { useMutation, useQueryClient } from "@tanstack/react-query";
import type { z } from "zod";
import { api } from "../../app/client.ts";
import { drawingQueries } from "./drawings.queries.ts";

/** Records a drawing or a new revision. */
export function useCreateDrawing() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof DrawingCreate>) => api.call(createDrawing, { body }),
    onSettled: () => cache.invalidateQueries({ queryKey: drawingQueries.all() }),
  });
}

/** Changes a drawing as it was seen. */
export function usePatchDrawing(drawing: Drawing) {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: DrawingPatch) =>
      api.call(patchDrawing, { params: { id: drawing.id }, body, seen_version: drawing.version }),
    onSettled: () => cache.invalidateQueries({ queryKey: drawingQueries.all() }),
  });
}

/** Changes a model seam as it was seen. */
export function usePatchModelSeam(seam: ModelSeam) {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: ModelSeamPatch) =>
      api.call(patchModelSeam, { params: { id: seam.id }, body, seen_version: seam.version }),
    onSettled: () => cache.invalidateQueries({ queryKey: drawingQueries.all() }),
  });
}
