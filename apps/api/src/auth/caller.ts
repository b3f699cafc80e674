import type { Permission, Role } from "@beadroll/domain/auth/permissions";

/** Who makes a request. */
export type Caller =
  | {
      readonly kind: "person";
      readonly user_id: string;
      readonly login: string;
      readonly name: string;
      readonly roles: readonly Role[];
      readonly permissions: ReadonlySet<Permission>;
    }
  | {
      readonly kind: "machine";
      readonly key_id: string;
      readonly name: string;
      readonly cell_id: string | null;
      readonly permissions: ReadonlySet<Permission>;
    }
  | { readonly kind: "system"; readonly name: string; readonly permissions: ReadonlySet<Permission> }
  | { readonly kind: "nobody"; readonly permissions: ReadonlySet<Permission> };

/** The program itself, for what no person or machine asked for. */
export const systemCaller = (name: string): Caller => ({ kind: "system", name, permissions: new Set() });

export const NOBODY: Caller = { kind: "nobody", permissions: new Set() };

/** How a caller is named in the ledger and on records: `user i.varga`, `key Cell 2 PC`. */
export function actorName(caller: Caller): string {
  if (caller.kind === "person") return `user ${caller.login}`;
  if (caller.kind === "machine") return `key ${caller.name}`;
  return caller.kind === "system" ? `system ${caller.name}` : "nobody";
}

/** A name that is unique among callers, for idempotency keys and rate limits. */
export function callerKey(caller: Caller, address: string): string {
  if (caller.kind === "person") return `user:${caller.user_id}`;
  if (caller.kind === "machine") return `key:${caller.key_id}`;
  return `address:${address}`;
}
