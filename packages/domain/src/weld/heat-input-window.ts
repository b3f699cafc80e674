/** How a procedure was tested, as far as its heat input is concerned. */
export interface ProcedureTest {
  /** Level of ISO 15614-1: 2 is the usual one, 1 follows American practice. */
  readonly level: 1 | 2;
  /** Heat input (or arc energy, then compare arc energy) of the test piece, kJ/mm, above 0; at level 1 the highest used. */
  readonly tested_kj_mm: number;
  readonly impact_required: boolean;
  readonly hardness_required: boolean;
}

/**
 * The heat input that a procedure test qualifies. Level 2: up to 25 % above where impact tests are required, down to
 * 25 % below where hardness tests are; neither, no limit. Level 1: not above the tested where impact tests are required.
 * @returns both ends in kJ/mm, allowed themselves; null where there is no limit
 * @throws RangeError when the tested heat input is not above 0
 * Source: ISO 15614-1:2017+A1:2019, 8.4.7. Example: 1.2 kJ/mm, both required, level 2: 0.9 to 1.5 kJ/mm.
 */
export function heatInputWindow(procedure: ProcedureTest): { min: number | null; max: number | null } {
  const { level, tested_kj_mm, impact_required, hardness_required } = procedure;
  if (!(tested_kj_mm > 0 && Number.isFinite(tested_kj_mm))) {
    throw new RangeError(`tested_kj_mm: expected above 0, got ${tested_kj_mm}`);
  }
  if (level === 1) return { min: null, max: impact_required ? tested_kj_mm : null };
  return {
    min: hardness_required ? 0.75 * tested_kj_mm : null,
    max: impact_required ? 1.25 * tested_kj_mm : null,
  };
}
