/** What each kind of fault is called, what helps, and what it means to HTTP and to the command line. */
export interface FaultKind {
  /** Short, stable title: the problem document's `title`. */
  readonly title: string;
  /** One sentence of help, shown with the title in docs/api/problems.md. */
  readonly help: string;
  /** HTTP status of the problem document (RFC 9457). */
  readonly status: number;
  /** Exit code of the command line (design: 2 usage or unreadable input, 30 refused, 40 not allowed). */
  readonly exit: number;
}

const kind = (status: number, exit: number, title: string, help: string): FaultKind => ({
  title,
  help,
  status,
  exit,
});

/**
 * Every fault code of the product, in one registry: the API's problem types, the command line's exit
 * codes and the plain words of the web all come from it, so that a code is added in one place.
 */
export const FAULT_KINDS = {
  // Files that cannot be read
  "file-empty": kind(422, 2, "The file is empty", "Check that the controller finished writing it."),
  "file-truncated": kind(
    422,
    2,
    "The file ends too early",
    "It was cut while being written or copied; send it again whole.",
  ),
  "file-format-unknown": kind(
    415,
    2,
    "The file's format is not known",
    "Send one of the formats listed in docs/formats.",
  ),
  "file-header-invalid": kind(
    422,
    2,
    "The file's header cannot be read",
    "Compare the first lines with docs/formats.",
  ),
  "file-column-missing": kind(422, 2, "A column is missing", "Name the columns as docs/formats gives them."),
  "file-value-invalid": kind(
    422,
    2,
    "A value is not a number",
    "Mend the line named and send the file again.",
  ),
  "file-row-invalid": kind(
    422,
    2,
    "A row does not fit its columns",
    "Every row needs as many columns as the header or the first row; check separator and decimal mark.",
  ),
  "file-compressed": kind(415, 2, "The file is compressed", "Unpack it first."),
  "file-too-large": kind(
    413,
    30,
    "The file is too large",
    "Split the scan by seam; the limit stands in the message.",
  ),
  "file-type-refused": kind(
    415,
    30,
    "This kind of file is not accepted here",
    "The accepted kinds stand in the message.",
  ),
  // Scans and models
  "scan-units-implausible": kind(
    422,
    2,
    "The scan does not fit the model in the units declared",
    "Declare the unit the scan was written in: mm or in.",
  ),
  "scan-units-contradict": kind(
    422,
    2,
    "The file names another unit than was declared",
    "Declare the unit that the file's own names give.",
  ),
  "scan-too-few-points": kind(
    422,
    2,
    "The scan has too few points",
    "Scan the seam again; see the scan plan for the spacing needed.",
  ),
  "scan-poses-missing": kind(
    422,
    2,
    "Profiles need their poses",
    "Give the poses file, or a cloud in the part frame.",
  ),
  "scan-pose-invalid": kind(422, 2, "A pose is not valid", "A pose needs a point and a unit quaternion."),
  "scan-not-fitup": kind(
    409,
    30,
    "The scan is of the finished bead",
    "The corrected path and the fill follow from a scan of the fit-up; ask for them with that one.",
  ),
  "procedure-incomplete": kind(
    409,
    30,
    "The procedure does not say enough",
    "Ask the welding coordinator to give the range named, in a new revision.",
  ),
  "registration-undetermined": kind(
    422,
    2,
    "The scan's place on the part is not determined",
    "Give at least three datum points that are not on one line.",
  ),
  "model-invalid": kind(422, 2, "The model cannot be used", "Compare it with docs/formats/model.md."),
  // Pass logs
  "log-clock-reset": kind(
    422,
    2,
    "The log's clock runs backwards",
    "A log must be one recording; send each recording as its own pass.",
  ),
  "log-no-arc": kind(
    422,
    2,
    "No arc burned in this log",
    "Current never stayed above the arc-on level; check the units and the file.",
  ),
  // Proofs
  "proof-invalid": kind(
    422,
    12,
    "A ledger proof does not hold",
    "The record may have been changed; ask for a fresh copy and check it against a checkpoint kept elsewhere.",
  ),
  // Requests
  "request-invalid": kind(422, 30, "The request does not fit", "Mend the fields named."),
  "request-malformed": kind(
    400,
    30,
    "The request cannot be read",
    "Send JSON or multipart as the API guide shows.",
  ),
  "parameter-unknown": kind(
    400,
    30,
    "A query parameter is not known",
    "See the operation in the API documents.",
  ),
  "tag-invalid": kind(422, 2, "The tag is mistyped", "Its check character does not match; read it again."),
  "not-found": kind(404, 30, "Nothing here has that name", "Check the tag or the address."),
  "method-not-allowed": kind(405, 30, "That cannot be done here", "The Allow header names what can."),
  conflict: kind(409, 30, "This clashes with what is recorded", "The message names what it clashes with."),
  "state-conflict": kind(409, 30, "The record's state does not allow this", "The message names the state."),
  "version-stale": kind(412, 30, "Somebody changed this meanwhile", "Load it again and repeat your change."),
  "version-required": kind(428, 30, "The version you saw is needed", "Send If-Match with the ETag you read."),
  "idempotency-mismatch": kind(
    422,
    30,
    "This key was used with another body",
    "Use a new Idempotency-Key for a new record.",
  ),
  "idempotency-required": kind(
    400,
    30,
    "An Idempotency-Key is needed",
    "Send a key that is unique for this record.",
  ),
  "seam-of-other-part": kind(
    422,
    30,
    "That seam belongs to another part",
    "Check the seam's tag on the label.",
  ),
  // Who may
  "not-signed-in": kind(401, 40, "You are not signed in", "Sign in, or send the machine's key."),
  "sign-in-failed": kind(
    401,
    40,
    "Name or password is wrong",
    "Try again; after several failures the account waits.",
  ),
  "not-allowed": kind(
    403,
    40,
    "Your role does not allow this",
    "Ask an administrator for the role or scope named.",
  ),
  "rate-limited": kind(429, 30, "Too many requests", "Wait for the time in Retry-After."),
  // The server itself
  busy: kind(
    503,
    20,
    "The server is busy",
    "It will answer after the time in Retry-After; nothing was lost.",
  ),
  internal: kind(
    500,
    1,
    "Something failed on the server",
    "Nothing was changed. Give the request's id to your administrator.",
  ),
} as const satisfies Record<string, FaultKind>;

/** A stable fault code; its problem type is `<docs>/problems#<code>`. */
export type FaultCode = keyof typeof FAULT_KINDS;
