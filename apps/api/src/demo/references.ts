import type { Ref, SeamRef } from "@beadroll/seeds/demo-event";
import type { Knex } from "knex";
import { personCaller } from "../auth/authenticate.ts";
import { type Caller, systemCaller } from "../auth/caller.ts";

/** What the scenario's names stand for in the database. */
export interface References {
  put(ref: Ref, made: { readonly id: string; readonly tag?: string }): void;
  has(ref: Ref): boolean;
  id(ref: Ref): string;
  tag(ref: Ref): string;
  seamTag(seam: SeamRef): Promise<string>;
  caller(by: string): Promise<Caller>;
}

/** References over a database that is being filled. */
export function references(reader: Knex, setupActor: string): References {
  const made = new Map<Ref, { readonly id: string; readonly tag?: string }>();
  const seams = new Map<string, string>();
  const callers = new Map<string, Caller>();

  const known = (ref: Ref) => {
    const found = made.get(ref);
    if (!found) throw new Error(`the scenario names "${ref}" before it is made`);
    return found;
  };

  async function loadSeams(part: Ref): Promise<void> {
    const rows: { number: string; tag: string }[] = await reader("seams")
      .join("model_seams", "model_seams.id", "seams.model_seam_id")
      .where({ part_id: known(part).id })
      .select("model_seams.number", "seams.tag");
    for (const { number, tag } of rows) seams.set(`${part} ${number}`, tag);
  }

  async function findCaller(by: string): Promise<Caller> {
    const user: { id: string } | undefined = await reader("users").where({ login: by }).first("id");
    const person = user && (await personCaller(reader, user.id));
    if (person) return person;
    const key: { id: string; cell_id: string | null } | undefined = await reader("api_keys")
      .where({ name: by })
      .first("id", "cell_id");
    if (!key) throw new Error(`the scenario lets "${by}" act, who is neither user nor key`);
    return { kind: "machine", key_id: key.id, name: by, cell_id: key.cell_id, permissions: new Set() };
  }

  return {
    put: (ref, thing) => made.set(ref, thing),
    has: (ref) => made.has(ref),
    id: (ref) => known(ref).id,
    tag: (ref) => {
      const { tag } = known(ref);
      if (tag === undefined) throw new Error(`"${ref}" has no tag`);
      return tag;
    },
    seamTag: async (seam) => {
      const key = `${seam.part} ${seam.number}`;
      if (!seams.has(key)) await loadSeams(seam.part);
      const tag = seams.get(key);
      if (tag === undefined) throw new Error(`"${seam.part}" has no seam ${seam.number}`);
      return tag;
    },
    caller: async (by) => {
      if (by === setupActor) return systemCaller("setup");
      const caller = callers.get(by) ?? (await findCaller(by));
      callers.set(by, caller);
      return caller;
    },
  };
}
