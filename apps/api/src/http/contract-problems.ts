import type { Contract } from "@beadroll/domain/contract/contract";
import type { FaultCode } from "@beadroll/domain/faults/codes";

/** Problems that any operation can answer with, beside those its contract names. */
export function problemsOf(contract: Contract): FaultCode[] {
  const codes = new Set<FaultCode>([...contract.problems, "rate-limited", "internal"]);
  if (contract.access !== "open") codes.add("not-signed-in");
  if (contract.access !== "open" && contract.access !== "signed-in") codes.add("not-allowed");
  if (contract.body) codes.add("request-malformed");
  if (contract.query || !contract.body) codes.add("parameter-unknown");
  if (contract.query) codes.add("request-invalid");
  if (contract.guard === "idempotency-key") {
    codes.add("idempotency-required");
    codes.add("idempotency-mismatch");
  }
  return [...codes];
}
