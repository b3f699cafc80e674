import type { ErrorRequestHandler } from "express";
import { MulterError } from "multer";
import type { Logger } from "pino";
import { sendProblem } from "./problem.ts";
import { Refusal, refusal } from "./refusal.ts";

/** What body parsers throw: an error with a status and a type. */
interface ParserError extends Error {
  readonly status: number;
  readonly type: string;
}

const isParserError = (error: unknown): error is ParserError =>
  error instanceof Error && "type" in error && typeof error.type === "string" && "status" in error;

function asRefusal(error: unknown): Refusal | null {
  if (error instanceof Refusal) return error;
  if (error instanceof MulterError)
    return refusal("request-malformed", `The upload cannot be read: ${error.message}.`);
  if (error instanceof URIError)
    return refusal("request-malformed", "The address holds a % that is no escape.");
  if (!isParserError(error)) return null;
  if (error.status === 413) return refusal("file-too-large", "The request's body is larger than 1 MB.");
  return refusal(
    "request-malformed",
    `The body cannot be read as ${error.type.startsWith("entity") ? "JSON" : "sent"}.`,
  );
}

/** The one error handler: refusals become problem documents, everything else a fixed text and a line in the log. */
export function errorHandler(log: Logger): ErrorRequestHandler {
  return (error: unknown, _req, res, next) => {
    if (res.headersSent) {
      next(error);
      return;
    }
    const refused = asRefusal(error);
    if (refused) {
      if (refused.retry_after_s !== null) res.set("Retry-After", String(refused.retry_after_s));
      sendProblem(res, refused.faults);
      return;
    }
    log.error({ err: error, request_id: res.locals["request_id"] }, "request failed");
    sendProblem(res, [
      {
        code: "internal",
        detail:
          "Something failed on the server; nothing was changed. Give the request's id to your administrator.",
      },
    ]);
  };
}
