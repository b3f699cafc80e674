import type { Role } from "@beadroll/domain/auth/permissions";
import type { Ref } from "./demo-event.ts";

/** An account of the demo shop; its password is no secret and stands in the documents. */
export interface DemoAccount {
  readonly login: string;
  readonly password: string;
  readonly name: string;
  readonly job: string;
  readonly roles: readonly Role[];
  readonly person: Ref;
}

/** Who can sign in to the demo shop. All invented. */
export const DEMO_ACCOUNTS = [
  {
    login: "t.brandal",
    password: "demo-administrator",
    name: "Tove Brandal",
    job: "Administrator",
    roles: ["administrator"],
    person: "person-brandal",
  },
  {
    login: "h.oyelaran",
    password: "demo-coordinator",
    name: "Henrik Oyelaran",
    job: "Welding coordinator",
    roles: ["coordinator"],
    person: "person-oyelaran",
  },
  {
    login: "i.varga",
    password: "demo-operator-one",
    name: "Ilka Varga",
    job: "Welding operator",
    roles: ["operator"],
    person: "person-varga",
  },
  {
    login: "d.castell",
    password: "demo-operator-two",
    name: "Dario Castell",
    job: "Welding operator",
    roles: ["operator"],
    person: "person-castell",
  },
  {
    login: "n.halvorsen",
    password: "demo-operator-three",
    name: "Noor Halvorsen",
    job: "Welding operator",
    roles: ["operator"],
    person: "person-halvorsen",
  },
  {
    login: "m.solheim",
    password: "demo-inspector-one",
    name: "Marek Solheim",
    job: "Inspector",
    roles: ["inspector"],
    person: "person-solheim",
  },
  {
    login: "a.duarte",
    password: "demo-inspector-two",
    name: "Amina Duarte",
    job: "Inspector",
    roles: ["inspector"],
    person: "person-duarte",
  },
  {
    login: "s.kowal",
    password: "demo-quality-lead",
    name: "Sanne Kowal",
    job: "Quality lead",
    roles: ["quality"],
    person: "person-kowal",
  },
  {
    login: "p.lindqvist",
    password: "demo-auditor-reads",
    name: "Pia Lindqvist",
    job: "Auditor",
    roles: ["auditor"],
    person: "person-lindqvist",
  },
  {
    login: "y.demir",
    password: "demo-integrator",
    name: "Yusuf Demir",
    job: "Planning and goods in",
    roles: ["integrator"],
    person: "person-demir",
  },
] as const satisfies readonly DemoAccount[];

export type DemoLogin = (typeof DEMO_ACCOUNTS)[number]["login"];

/** A cell computer's key. Fixed and published: it opens the demo shop and nothing else. */
export interface DemoKey {
  readonly ref: Ref;
  readonly name: string;
  readonly cell: Ref;
  readonly secret: string;
}

/** The cell computers' keys: `brk_` and 32 Crockford symbols. */
export const DEMO_KEYS = [
  {
    ref: "key-cell-1",
    name: "Cell 1 PC",
    cell: "cell-1",
    secret: "brk_CE11DEM0CE11DEM0CE11DEM0CE11DEM0",
  },
  {
    ref: "key-cell-2",
    name: "Cell 2 PC",
    cell: "cell-2",
    secret: "brk_CE12DEM0CE12DEM0CE12DEM0CE12DEM0",
  },
] as const satisfies readonly DemoKey[];
