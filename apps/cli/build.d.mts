/** Builds beadroll.mjs into a folder, apps/cli/dist unless another is given; its size in bytes. */
export function buildCli(outdir?: string): Promise<number>;
