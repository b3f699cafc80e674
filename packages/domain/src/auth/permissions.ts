/** Roles a person can hold (design, "Who uses it"). */
export const ROLES = [
  "administrator",
  "coordinator",
  "operator",
  "inspector",
  "quality",
  "auditor",
  "integrator",
] as const;
export type Role = (typeof ROLES)[number];

/** What a request may need. `open` and `signed-in` are not granted; they are written on the contract. */
export const PERMISSIONS = [
  "records:read",
  "ledger:read",
  "labels:print",
  "drawings:write",
  "procedures:write",
  "people:write",
  "parts:write",
  "lots:write",
  "scans:write",
  "passes:write",
  "mounts:write",
  "inspections:write",
  "cells:write",
  "users:manage",
  "keys:manage",
] as const;
export type Permission = (typeof PERMISSIONS)[number];

/** Scopes a machine's key can carry; the rest is for people only. */
export const KEY_SCOPES = [
  "records:read",
  "scans:write",
  "passes:write",
  "mounts:write",
  "parts:write",
  "lots:write",
] as const satisfies readonly Permission[];
export type KeyScope = (typeof KEY_SCOPES)[number];

const GRANTS: Record<Role, readonly Permission[]> = {
  administrator: [
    "records:read",
    "ledger:read",
    "labels:print",
    "people:write",
    "cells:write",
    "users:manage",
    "keys:manage",
  ],
  coordinator: [
    "records:read",
    "ledger:read",
    "labels:print",
    "drawings:write",
    "procedures:write",
    "people:write",
    "parts:write",
    "lots:write",
    "scans:write",
  ],
  operator: ["records:read", "labels:print", "scans:write", "passes:write", "mounts:write"],
  inspector: ["records:read", "labels:print", "inspections:write"],
  quality: ["records:read", "ledger:read", "labels:print", "parts:write", "lots:write", "inspections:write"],
  auditor: ["records:read", "ledger:read"],
  integrator: ["records:read", "parts:write", "lots:write"],
};

/** Every permission that a set of roles gives, each once. Deny by default: no role, no permission. */
export function permissionsOf(roles: readonly Role[]): Permission[] {
  const granted = new Set(roles.flatMap((role) => GRANTS[role]));
  return PERMISSIONS.filter((permission) => granted.has(permission));
}
