import type { DatumPoint } from "@beadroll/domain/measure/register/register-points";
import { z } from "zod";
import { EXIT } from "../exit-codes.ts";
import { stop } from "../output/outcome.ts";
import { readInput } from "./read-input.ts";

const point = z.tuple([z.number(), z.number(), z.number()]);
const Datums = z.array(
  z.strictObject({ nominal: point, measured: point, weight: z.number().positive().optional() }),
);

/** A file of datum points, checked. Stops with exit code 2, naming the first faulty place. */
export async function readDatums(path: string): Promise<DatumPoint[]> {
  const { bytes } = await readInput(path);
  let json: unknown;
  try {
    json = JSON.parse(new TextDecoder("utf-8", { fatal: true }).decode(bytes));
  } catch (error) {
    if (!(error instanceof SyntaxError || error instanceof TypeError)) throw error;
    return stop(EXIT.usage, { error: "datum-invalid", detail: `${path}: it is no JSON: ${error.message}` });
  }
  const parsed = Datums.safeParse(json);
  if (!parsed.success) {
    const [issue] = parsed.error.issues;
    const place = issue?.path.map(String).join("/") ?? "";
    return stop(EXIT.usage, {
      error: "datum-invalid",
      detail: `${path}: /${place}: ${issue?.message ?? "not datum points"}`,
    });
  }
  return parsed.data.map(({ nominal, measured, weight }) => ({
    nominal,
    measured,
    ...(weight !== undefined && { weight }),
  }));
}
