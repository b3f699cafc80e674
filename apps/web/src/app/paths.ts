import type { Permission } from "@beadroll/domain/auth/permissions";
import { generatePath } from "react-router";

/** What a page of the application is: its address, the file that draws it, and its word in the top bar. */
export interface PageEntry {
  readonly path: string;
  /** `src/pages/<file>-page.tsx`; as long as it does not exist there is no route and no word in the bar. */
  readonly file: string;
  readonly nav?: string;
  /** The word in the bar is only for those who hold this. */
  readonly needs?: Permission;
}

/** The one table of addresses. Pages link with `pathTo`, never with an address of their own. */
export const PATHS = {
  signIn: { path: "/sign-in", file: "sign-in" },
  floor: { path: "/", file: "floor", nav: "Floor" },
  parts: { path: "/parts", file: "parts", nav: "Parts" },
  partNew: { path: "/parts/new", file: "part-new" },
  part: { path: "/parts/:tag", file: "part" },
  seam: { path: "/seams/:tag", file: "seam" },
  lots: { path: "/lots", file: "lots", nav: "Lots" },
  lotNew: { path: "/lots/new", file: "lot-new" },
  lot: { path: "/lots/:tag", file: "lot" },
  procedures: { path: "/procedures", file: "procedures", nav: "Procedures" },
  procedureNew: { path: "/procedures/new", file: "procedure-new" },
  procedure: { path: "/procedures/:id", file: "procedure" },
  drawings: { path: "/drawings", file: "drawings", nav: "Drawings" },
  drawingNew: { path: "/drawings/new", file: "drawing-new" },
  drawing: { path: "/drawings/:id", file: "drawing" },
  modelSeam: { path: "/drawings/:id/seams/:number", file: "model-seam" },
  people: { path: "/people", file: "people", nav: "People" },
  personNew: { path: "/people/new", file: "person-new" },
  person: { path: "/people/:tag", file: "person" },
  users: { path: "/users", file: "users", nav: "Users", needs: "users:manage" },
  tagDoor: { path: "/t/:tag", file: "tag-door" },
  inspection: { path: "/inspection", file: "inspection", nav: "Inspection" },
  reach: { path: "/reach", file: "reach", nav: "Reach" },
  drift: { path: "/drift", file: "drift", nav: "Drift" },
  records: { path: "/records", file: "records", nav: "Records", needs: "ledger:read" },
  find: { path: "/find", file: "find" },
  kit: { path: "/kit", file: "kit" },
} as const satisfies Record<string, PageEntry>;

export type PageName = keyof typeof PATHS;

type NamesIn<Path extends string> = Path extends `${string}:${infer Name}/${infer Rest}`
  ? Name | NamesIn<`/${Rest}`>
  : Path extends `${string}:${infer Name}`
    ? Name
    : never;

type ParamsOf<Name extends PageName> = Readonly<Record<NamesIn<(typeof PATHS)[Name]["path"]>, string>>;

type ParamsArgument<Name extends PageName> = [NamesIn<(typeof PATHS)[Name]["path"]>] extends [never]
  ? []
  : [params: ParamsOf<Name>];

/** The address of a page: `pathTo("part", { tag: "P-8K3F7Q2NA" })` is `/parts/P-8K3F7Q2NA`. */
export function pathTo<Name extends PageName>(name: Name, ...params: ParamsArgument<Name>): string {
  const path: string = PATHS[name].path;
  const values: Readonly<Record<string, string>> | undefined = params[0];
  return generatePath(path, { ...values });
}

/** The address of the search for what was typed. */
export function findPath(text: string): string {
  return `${PATHS.find.path}?${new URLSearchParams({ q: text }).toString()}`;
}
