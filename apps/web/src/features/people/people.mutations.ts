import { addQualification, createPerson } from "@beadroll/domain/contract/people.contract";
import type { PersonCreate, QualificationCreate } from "@beadroll/domain/schemas/person";
import { useMutation, useQueryClient } from "@tanstack/react-query";
import { api } from "../../app/client.ts";
import { peopleQueries } from "./people.queries.ts";

/** Records a person. */
export function useCreatePerson() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: PersonCreate) => api.call(createPerson, { body }),
    onSettled: () => cache.invalidateQueries({ queryKey: peopleQueries.all() }),
  });
}

/** Records a qualification of a person. */
export function useAddQualification(tag: string) {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: QualificationCreate) => api.call(addQualification, { params: { tag }, body }),
    onSettled: () => cache.invalidateQueries({ queryKey: peopleQueries.all() }),
  });
}
