import * as contracts from "@beadroll/domain/contract/seams.contract";
import { z } from "zod";
import { changeContext, type Deps } from "../deps.ts";
import { refusal } from "../http/refusal.ts";
import { type Route, route } from "../http/route.ts";
import { readPass } from "./passes.read.ts";
import { recordPass } from "./passes.service.ts";

const Remembered = z.object({ pass_id: z.string() });

/** Weld runs of seams. */
export function passRoutes(deps: Deps): Route[] {
  return [
    route(
      contracts.pushPass,
      (input) => {
        const { log } = input.files;
        if (!log) throw refusal("request-invalid", 'The file part "log" is missing.', { field: "log" });
        return recordPass(deps, changeContext(deps, input), {
          seam_tag: input.params.tag,
          fields: input.body,
          log,
        });
      },
      (remembered) => readPass(deps.db.reader, Remembered.parse(remembered).pass_id),
    ),
  ];
}
