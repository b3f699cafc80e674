import { addCertificate, createLot, patchLot } from "@beadroll/domain/contract/lots.contract";
import { uploadFile } from "@beadroll/domain/contract/records.contract";
import type { CertificateCreate, Lot, LotCreate, LotPatch } from "@beadroll/domain/schemas/lot";
import { useMutation, useQueryClient } from "@tanstack/react-query";
import { api } from "../../app/client.ts";
import { lotQueries } from "./lots.queries.ts";

/** Receives a lot. */
export function useCreateLot() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: LotCreate) => api.call(createLot, { body }),
    onSettled: () => cache.invalidateQueries({ queryKey: lotQueries.all() }),
  });
}

/** Changes a lot as it was seen; a change by somebody else meanwhile is refused. */
export function usePatchLot(lot: Lot) {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: LotPatch) =>
      api.call(patchLot, { params: { tag: lot.tag }, body, seen_version: lot.version }),
    onSettled: () => cache.invalidateQueries({ queryKey: lotQueries.all() }),
  });
}

/** Records a certificate; its document is stored first. */
export function useAddCertificate(tag: string) {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: async ({ certificate, file }: { certificate: CertificateCreate; file: File | null }) => {
      const stored =
        file === null
          ? null
          : await api.call(uploadFile, { body: {}, files: { file: { name: file.name, bytes: file } } });
      const body = { ...certificate, file_digest: stored?.digest ?? null };
      return api.call(addCertificate, { params: { tag }, body });
    },
    onSettled: () => cache.invalidateQueries({ queryKey: lotQueries.all() }),
  });
}
