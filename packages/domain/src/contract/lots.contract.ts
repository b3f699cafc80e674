import { z } from "zod";
import {
  Certificate,
  CertificateCreate,
  LOT_KINDS,
  LOT_STATES,
  Lot,
  LotCreate,
  LotPage,
  LotPatch,
} from "../schemas/lot.ts";
import { PageQuery, pageOf } from "../schemas/paging.ts";
import { contract } from "./contract.ts";
import { TagParams } from "./parameters.ts";

const group = "Lots and certificates";

export const listLots = contract({
  method: "get",
  path: "/lots",
  operationId: "listLots",
  summary: "Lots, newest first",
  group,
  access: "records:read",
  query: z.strictObject({
    ...PageQuery,
    kind: z.enum(LOT_KINDS).optional().meta({ description: "Only this kind" }),
    state: z.enum(LOT_STATES).optional().meta({ description: "Only this state" }),
    number: z.string().max(60).optional().meta({ description: "Only numbers that begin so", example: "H48" }),
  }),
  answer: { status: 200, description: "A page of lots", schema: pageOf(Lot) },
  problems: ["parameter-unknown"],
});

export const createLot = contract({
  method: "post",
  path: "/lots",
  operationId: "createLot",
  summary: "Receive a lot",
  group,
  access: "lots:write",
  guard: "idempotency-key",
  body: { kind: "json", schema: LotCreate },
  answer: { status: 201, description: "The lot", schema: Lot },
  problems: ["request-invalid", "conflict"],
});

export const getLot = contract({
  method: "get",
  path: "/lots/{tag}",
  operationId: "getLot",
  summary: "A lot, its certificates and where it went",
  group,
  access: "records:read",
  params: TagParams,
  answer: { status: 200, description: "The lot", schema: LotPage },
  problems: ["tag-invalid", "not-found"],
});

export const patchLot = contract({
  method: "patch",
  path: "/lots/{tag}",
  operationId: "patchLot",
  summary: "Release, quarantine or close a lot",
  group,
  access: "lots:write",
  guard: "if-match",
  params: TagParams,
  body: { kind: "json", schema: LotPatch },
  answer: { status: 200, description: "The lot as it is now", schema: Lot },
  problems: ["request-invalid", "tag-invalid", "not-found", "version-stale", "version-required"],
});

export const addCertificate = contract({
  method: "post",
  path: "/lots/{tag}/certificates",
  operationId: "addCertificate",
  summary: "Record the inspection document of a lot",
  group,
  access: "lots:write",
  guard: "idempotency-key",
  params: TagParams,
  body: { kind: "json", schema: CertificateCreate },
  answer: { status: 201, description: "The certificate", schema: Certificate },
  problems: ["request-invalid", "tag-invalid", "not-found", "conflict"],
});
