import { z } from "zod";
import { PageQuery, pageOf } from "../schemas/paging.ts";
import { Procedure, ProcedureCreate, ProcedurePatch } from "../schemas/procedure.ts";
import { contract } from "./contract.ts";
import { IdParams } from "./parameters.ts";

const group = "Procedures";

export const listProcedures = contract({
  method: "get",
  path: "/procedures",
  operationId: "listProcedures",
  summary: "Welding procedures, by number and revision",
  group,
  access: "records:read",
  query: z.strictObject({
    ...PageQuery,
    status: Procedure.shape.status.optional().meta({ description: "Only this status" }),
  }),
  answer: { status: 200, description: "A page of procedures", schema: pageOf(Procedure) },
  problems: ["parameter-unknown"],
});

export const createProcedure = contract({
  method: "post",
  path: "/procedures",
  operationId: "createProcedure",
  summary: "Record a procedure or a new revision, as a draft",
  group,
  access: "procedures:write",
  guard: "idempotency-key",
  body: { kind: "json", schema: ProcedureCreate },
  answer: { status: 201, description: "The procedure", schema: Procedure },
  problems: ["request-invalid", "conflict"],
});

export const getProcedure = contract({
  method: "get",
  path: "/procedures/{id}",
  operationId: "getProcedure",
  summary: "A procedure",
  group,
  access: "records:read",
  params: IdParams,
  answer: { status: 200, description: "The procedure", schema: Procedure },
  problems: ["not-found"],
});

export const patchProcedure = contract({
  method: "patch",
  path: "/procedures/{id}",
  operationId: "patchProcedure",
  summary: "Change, approve or withdraw a procedure",
  description: "The ranges of a procedure that has been welded to are frozen; make a new revision.",
  group,
  access: "procedures:write",
  guard: "if-match",
  params: IdParams,
  body: { kind: "json", schema: ProcedurePatch },
  answer: { status: 200, description: "The procedure as it is now", schema: Procedure },
  problems: ["request-invalid", "not-found", "state-conflict", "version-stale", "version-required"],
});
