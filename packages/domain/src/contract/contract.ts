import type { z } from "zod";
import type { Permission } from "../auth/permissions.ts";
import type { FaultCode } from "../faults/codes.ts";

/** Who may call: everyone, everyone signed in, or those with one permission. There is no default. */
export type Access = "open" | "signed-in" | Permission;

/** A file part of a multipart body. */
export interface FilePart {
  readonly description: string;
  readonly required: boolean;
  readonly max_bytes: number;
}

/** How a request carries its content. */
export type ContractBody =
  | { readonly kind: "json"; readonly schema: z.ZodType }
  | {
      readonly kind: "multipart";
      readonly schema: z.ZodType;
      readonly files: Readonly<Record<string, FilePart>>;
    };

/** What a good answer carries. */
export type ContractAnswer =
  | { readonly status: 200 | 201; readonly description: string; readonly schema: z.ZodType }
  | { readonly status: 200; readonly description: string; readonly media_type: string }
  | { readonly status: 204; readonly description: string };

/** How a request that changes something is kept from happening twice or over another's change. */
export type Guard = "idempotency-key" | "if-match";

/**
 * One operation of the API: the server registers its route and its OpenAPI path from it, the client
 * derives its typed call from it. `path` is under /api/v1, with parameters in braces.
 */
export interface Contract {
  readonly method: "get" | "post" | "patch" | "delete";
  readonly path: `/${string}`;
  readonly operationId: string;
  readonly summary: string;
  readonly description?: string;
  readonly group: string;
  readonly access: Access;
  readonly guard?: Guard;
  readonly params?: z.ZodObject;
  readonly query?: z.ZodObject;
  readonly body?: ContractBody;
  readonly answer: ContractAnswer;
  readonly problems: readonly FaultCode[];
}

/** Declares an operation and keeps its exact type for the client and the handler. */
export function contract<const C extends Contract>(declaration: C): C {
  return declaration;
}

/** Path parameters of an operation, as its handler reads them. */
export type ParamsOf<C extends Contract> = C extends { params: infer P extends z.ZodObject }
  ? z.output<P>
  : undefined;

/** Query of an operation, as its handler reads it: defaults filled in. */
export type QueryOf<C extends Contract> = C extends { query: infer Q extends z.ZodObject }
  ? z.output<Q>
  : undefined;

/** Query of an operation, as a caller gives it. */
export type QueryInput<C extends Contract> = C extends { query: infer Q extends z.ZodObject }
  ? z.input<Q>
  : undefined;

/** Body fields of an operation, as its handler reads them. */
export type BodyOf<C extends Contract> = C extends { body: { schema: infer B extends z.ZodType } }
  ? z.output<B>
  : undefined;

/** Body fields of an operation, as a caller gives them. */
export type BodyInput<C extends Contract> = C extends { body: { schema: infer B extends z.ZodType } }
  ? z.input<B>
  : undefined;

/** What an operation answers with. */
export type AnswerOf<C extends Contract> = C extends { answer: { schema: infer A extends z.ZodType } }
  ? z.output<A>
  : undefined;
