import type { Contract, ContractBody } from "@beadroll/domain/contract/contract";
import type { Fault } from "@beadroll/domain/faults/fault";
import type { Request, RequestHandler } from "express";
import multer, { MulterError, type StorageEngine } from "multer";
import type { FileStore, KeptBytes } from "../files/file-store.ts";
import { Refusal, refusal } from "./refusal.ts";

/** A file of a multipart request, already kept in the store. */
export interface ReceivedFile extends KeptBytes {
  readonly name: string;
  readonly media_type: string;
}

type Multipart = Extract<ContractBody, { kind: "multipart" }>;

/** Streams each file part into the store as it comes, so that memory stays flat whatever its size. */
function storageIn(store: FileStore): StorageEngine {
  return {
    _handleFile: (_req, file, done) => {
      store.keep(file.stream).then(
        // multer hands these fields on as the file; `path` is its name for where the bytes are.
        (kept) => done(null, { path: kept.digest, size: kept.size }),
        (error: unknown) => done(error),
      );
    },
    // Kept bytes are shared by address; a refused request leaves at most unreferenced bytes behind.
    _removeFile: (_req, _file, done) => done(null),
  };
}

const megabytes = (bytes: number): string => `${Math.round(bytes / (1024 * 1024))} MB`;

function tooLarge(limit: number, field?: string): Refusal {
  return refusal(
    "file-too-large",
    `${field ?? "The upload"} is larger than ${megabytes(limit)}.`,
    field ? { field } : {},
  );
}

function asRefusal(error: unknown, limit: number): unknown {
  if (!(error instanceof MulterError)) return error;
  if (error.code === "LIMIT_FILE_SIZE") return tooLarge(limit, error.field);
  if (error.code === "LIMIT_UNEXPECTED_FILE")
    return refusal("request-invalid", `"${error.field ?? ""}" is not a file part here.`, {
      field: error.field ?? "",
    });
  return refusal("request-malformed", `The upload cannot be read: ${error.message}.`);
}

/** Reads a multipart body into the store. Refuses early when the announced length cannot fit. */
export function receiveMultipart(body: Multipart, store: FileStore): RequestHandler {
  const parts = Object.entries(body.files);
  const largest = Math.max(...parts.map(([, part]) => part.max_bytes));
  const total = parts.reduce((sum, [, part]) => sum + part.max_bytes, 64 * 1024);
  const parse = multer({
    storage: storageIn(store),
    limits: { fileSize: largest, files: parts.length, fields: 20, fieldSize: 8192, parts: parts.length + 20 },
  }).fields(parts.map(([name]) => ({ name, maxCount: 1 })));
  return (req, res, next) => {
    if (!req.is("multipart/form-data")) {
      next(refusal("request-malformed", "Send multipart/form-data."));
      return;
    }
    if (Number(req.headers["content-length"] ?? 0) > total) {
      refuseUnread(req, tooLarge(largest, parts[0]?.[0]), next);
      return;
    }
    parse(req, res, (error: unknown) => {
      if (error) refuseUnread(req, asRefusal(error, largest), next);
      else next();
    });
  };
}

/** Answers while the rest of the body is still coming: the sender must be able to read why. */
function refuseUnread(req: Request, error: unknown, next: (error: unknown) => void): void {
  req.resume();
  req.res?.set("Connection", "close");
  next(error);
}

/** The files of a request by part name. @throws Refusal when a required one is missing or empty */
export function receivedFiles(req: Request, contract: Contract): Record<string, ReceivedFile> {
  if (contract.body?.kind !== "multipart") return {};
  const uploaded = Array.isArray(req.files) || req.files === undefined ? {} : req.files;
  const faults: Fault[] = [];
  const files: Record<string, ReceivedFile> = {};
  for (const [name, part] of Object.entries(contract.body.files)) {
    const file = uploaded[name]?.[0];
    if (file === undefined) {
      if (part.required)
        faults.push({ code: "request-invalid", detail: `The file part "${name}" is missing.`, field: name });
    } else if (file.size === 0) {
      faults.push({
        code: "file-empty",
        detail: `${name}: the file "${file.originalname}" is empty.`,
        field: name,
      });
    } else {
      files[name] = {
        digest: file.path,
        size: file.size,
        name: fileName(file.originalname),
        media_type: file.mimetype,
      };
    }
  }
  if (faults.length > 0) throw new Refusal(faults);
  return files;
}

/** A name fit for the record: no folders, no control characters, 255 characters at most. */
function fileName(sent: string): string {
  const last = sent.split(/[\\/]/).at(-1) ?? "";
  // biome-ignore lint/suspicious/noControlCharactersInRegex: control characters are what is taken out.
  return last.replaceAll(/[\u0000-\u001f\u007f]/g, "").slice(0, 255) || "file";
}
