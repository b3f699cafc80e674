import { parseSeamModel, type SeamModel } from "@beadroll/domain/schemas/seam-model";
import { stopOnFaults } from "../output/fault-text.ts";
import { readInput } from "./read-input.ts";

/** A model file, checked. Stops with exit code 2 and every faulty place. */
export async function readModel(path: string): Promise<SeamModel> {
  const { bytes } = await readInput(path);
  let json: unknown;
  try {
    json = JSON.parse(new TextDecoder("utf-8", { fatal: true }).decode(bytes));
  } catch (error) {
    if (!(error instanceof SyntaxError || error instanceof TypeError)) throw error;
    const detail = `${path}: it is no JSON: ${error.message}`;
    return stopOnFaults([{ code: "model-invalid", detail }], [path]);
  }
  const model = parseSeamModel(json);
  return model.ok ? model.value : stopOnFaults(model.faults, [path]);
}
