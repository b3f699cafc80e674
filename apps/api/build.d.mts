/** Builds apps/api/dist. */
export function buildApi(): Promise<void>;
