import { z } from "zod";
import { StoredFile } from "../schemas/file.ts";
import { FindAnswer, TagAnswer } from "../schemas/find.ts";
import { LedgerRecord } from "../schemas/ledger-record.ts";
import { PageQuery, pageOf } from "../schemas/paging.ts";
import { digest } from "../schemas/quantities.ts";
import { contract } from "./contract.ts";
import { DOCUMENT_MAX_BYTES, TagParams } from "./parameters.ts";

export const find = contract({
  method: "get",
  path: "/find",
  operationId: "find",
  summary: "Search tags, serials, heats, lots, names, drawings and orders",
  group: "Find",
  access: "records:read",
  query: z.strictObject({
    q: z.string().trim().min(1).max(200).meta({ description: "What was typed or scanned", example: "0418" }),
  }),
  answer: { status: 200, description: "What was found", schema: FindAnswer },
  problems: ["parameter-unknown", "request-invalid"],
});

export const resolveTag = contract({
  method: "get",
  path: "/tags/{tag}",
  operationId: "resolveTag",
  summary: "What a tag is of",
  description: "A mistyped tag is refused by its check character before any look-up.",
  group: "Find",
  access: "records:read",
  params: TagParams,
  answer: { status: 200, description: "What it is of", schema: TagAnswer },
  problems: ["tag-invalid", "not-found"],
});

export const uploadFile = contract({
  method: "post",
  path: "/files",
  operationId: "uploadFile",
  summary: "Store a document: PDF, PNG, JPEG",
  group: "Files",
  access: "lots:write",
  body: {
    kind: "multipart",
    schema: z.strictObject({}),
    files: {
      file: { description: "The document", required: true, max_bytes: DOCUMENT_MAX_BYTES },
    },
  },
  answer: { status: 201, description: "The stored file", schema: StoredFile },
  problems: ["request-invalid", "file-empty", "file-too-large", "file-type-refused"],
});

export const getFile = contract({
  method: "get",
  path: "/files/{digest}",
  operationId: "getFile",
  summary: "The bytes of a stored file",
  group: "Files",
  access: "records:read",
  params: z.object({ digest: digest("Address of the file") }),
  answer: { status: 200, description: "The bytes as they came", media_type: "application/octet-stream" },
  problems: ["not-found"],
});

export const listLedger = contract({
  method: "get",
  path: "/ledger-entries",
  operationId: "listLedger",
  summary: "Ledger entries, latest first",
  group: "Ledger",
  access: "ledger:read",
  query: z.strictObject({
    ...PageQuery,
    subject: z.string().max(60).optional().meta({ description: "Only entries about this tag or id" }),
    action: z.string().max(60).optional().meta({ description: "Only this action", example: "scan.record" }),
  }),
  answer: { status: 200, description: "A page of entries", schema: pageOf(LedgerRecord) },
  problems: ["parameter-unknown"],
});

export const getLedgerEntry = contract({
  method: "get",
  path: "/ledger-entries/{seq}",
  operationId: "getLedgerEntry",
  summary: "A ledger entry with its leaf hash",
  group: "Ledger",
  access: "records:read",
  params: z.object({
    seq: z.coerce.number().int().min(0).meta({ description: "Place in the ledger", example: 412 }),
  }),
  answer: { status: 200, description: "The entry", schema: LedgerRecord },
  problems: ["not-found"],
});
