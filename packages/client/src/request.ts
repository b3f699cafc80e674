import type { Contract } from "@beadroll/domain/contract/contract";
import type { LooseInput } from "./call-input.ts";

/** What a request carries beside its input. */
export interface RequestSettings {
  readonly token: string | null;
  readonly timeout_ms: number | undefined;
}

const entriesOf = (value: unknown): [string, unknown][] =>
  typeof value === "object" && value !== null
    ? Object.entries(value).filter(([, item]) => item !== undefined && item !== null)
    : [];

/** The address of an operation, from /api/v1 on. @throws TypeError for a path parameter that is missing */
export function addressOf(contract: Contract, input: LooseInput): string {
  const params = new Map(entriesOf(input.params));
  const path = contract.path.replaceAll(/\{(\w+)\}/g, (_all, name: string) => {
    const value = params.get(name);
    if (value === undefined || value === "")
      throw new TypeError(`${contract.operationId}: expected the parameter ${name}`);
    return encodeURIComponent(String(value));
  });
  const query = new URLSearchParams();
  for (const [name, value] of entriesOf(input.query)) {
    for (const item of Array.isArray(value) ? value : [value]) query.append(name, String(item));
  }
  const text = query.toString();
  return `/api/v1${path}${text ? `?${text}` : ""}`;
}

/** Fields before files, so that a server that reads as it comes knows what the bytes are. */
function formOf(input: LooseInput): FormData {
  const form = new FormData();
  for (const [name, value] of entriesOf(input.body)) form.set(name, String(value));
  for (const [name, file] of Object.entries(input.files ?? {}))
    if (file !== undefined) form.set(name, file.bytes, file.name);
  return form;
}

function headersOf(contract: Contract, input: LooseInput, settings: RequestSettings): Headers {
  const headers = new Headers({ Accept: "application/json" });
  if (settings.token !== null) headers.set("Authorization", `Bearer ${settings.token}`);
  if (contract.guard === "idempotency-key" && input.idempotency_key !== undefined)
    headers.set("Idempotency-Key", input.idempotency_key);
  if (contract.guard === "if-match") {
    if (input.seen_version === undefined)
      throw new TypeError(`${contract.operationId}: expected seen_version, the version that was read`);
    headers.set("If-Match", `"${input.seen_version}"`);
  }
  if (contract.body?.kind === "json") headers.set("Content-Type", "application/json");
  return headers;
}

/** The caller's signal and the time limit, whichever comes first. */
function signalOf(input: LooseInput, timeout_ms: number | undefined): AbortSignal | undefined {
  if (timeout_ms === undefined) return input.signal;
  const limit = AbortSignal.timeout(timeout_ms);
  return input.signal === undefined ? limit : AbortSignal.any([input.signal, limit]);
}

/** A request for an operation. @throws TypeError when the input lacks what the contract needs */
export function requestOf(contract: Contract, input: LooseInput, settings: RequestSettings): RequestInit {
  const signal = signalOf(input, settings.timeout_ms);
  return {
    method: contract.method.toUpperCase(),
    headers: headersOf(contract, input, settings),
    credentials: "same-origin",
    // A POST that follows a redirect arrives as a GET: better to say where the server has gone.
    redirect: "manual",
    ...(signal && { signal }),
    ...(contract.body?.kind === "json" && { body: JSON.stringify(input.body ?? {}) }),
    ...(contract.body?.kind === "multipart" && { body: formOf(input) }),
  };
}
