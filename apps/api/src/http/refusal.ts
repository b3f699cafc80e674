import { FAULT_KINDS, type FaultCode } from "@beadroll/domain/faults/codes";
import type { Fault, Outcome } from "@beadroll/domain/faults/fault";

/** A request that is refused; the error handler turns it into a problem document. */
export class Refusal extends Error {
  readonly faults: readonly [Fault, ...Fault[]];
  /** Seconds after which trying again makes sense. */
  readonly retry_after_s: number | null;

  constructor(faults: readonly Fault[], retry_after_s: number | null = null) {
    const [first, ...rest] = faults;
    if (first === undefined) throw new TypeError("faults: expected one at least");
    super(first.detail);
    this.faults = [first, ...rest];
    this.retry_after_s = retry_after_s;
  }

  get status(): number {
    return FAULT_KINDS[this.faults[0].code].status;
  }
}

/** A refusal for one reason. */
export function refusal(
  code: FaultCode,
  detail: string,
  place: Omit<Fault, "code" | "detail"> = {},
): Refusal {
  return new Refusal([{ code, detail, ...place }]);
}

/** The value of a good outcome. @throws Refusal with the faults of a bad one */
export function accepted<T>(outcome: Outcome<T>): T {
  if (outcome.ok) return outcome.value;
  throw new Refusal(outcome.faults);
}
