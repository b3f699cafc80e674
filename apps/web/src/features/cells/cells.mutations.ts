import { createCell } from "@beadroll/domain/contract/cells.contract";
import type { CellCreate } from "@beadroll/domain/schemas/cell";
import { useMutation, useQueryClient } from "@tanstack/react-query";
import { api } from "../../app/client.ts";

/** Records a cell; the floor and every list of cells show it. */
export function useCreateCell() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: CellCreate) => api.call(createCell, { body }),
    onSettled: () =>
      Promise.all([
        cache.invalidateQueries({ queryKey: ["floor"] }),
        cache.invalidateQueries({ queryKey: ["cells"] }),
      ]),
  });
}
