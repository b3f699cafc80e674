/** Name and version of the measuring code; the version changes whenever a number might. */
export const MEASURE_ENGINE = "beadroll-measure 1.0.0";
