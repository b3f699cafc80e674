import { createKey, createUser, revokeKey } from "@beadroll/domain/contract/users.contract";
import type { ApiKeyCreate, UserCreate } from "@beadroll/domain/schemas/user";
import { useMutation, useQueryClient } from "@tanstack/react-query";
import { api } from "../../app/client.ts";

/** Makes an account. */
export function useCreateUser() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: UserCreate) => api.call(createUser, { body }),
    onSettled: () => cache.invalidateQueries({ queryKey: ["users"] }),
  });
}

/** Makes a machine's key. */
export function useCreateKey() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: ApiKeyCreate) => api.call(createKey, { body }),
    onSettled: () => cache.invalidateQueries({ queryKey: ["keys"] }),
  });
}

/** Withdraws a machine's key. */
export function useRevokeKey() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (id: string) => api.call(revokeKey, { params: { id } }),
    onSettled: () => cache.invalidateQueries({ queryKey: ["keys"] }),
  });
}
