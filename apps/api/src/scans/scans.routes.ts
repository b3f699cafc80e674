import * as contracts from "@beadroll/domain/contract/seams.contract";
import { z } from "zod";
import { changeContext, type Deps } from "../deps.ts";
import { refusal } from "../http/refusal.ts";
import { type Route, route } from "../http/route.ts";
import { readScanPage } from "./scans.read.ts";
import { readSection, recordScan } from "./scans.service.ts";

const Remembered = z.object({ scan_id: z.string() });

/** Scans of seams. */
export function scanRoutes(deps: Deps): Route[] {
  const { reader } = deps.db;
  return [
    route(
      contracts.pushScan,
      (input) => {
        const { scan, poses } = input.files;
        if (!scan) throw refusal("request-invalid", 'The file part "scan" is missing.', { field: "scan" });
        const pushed = { seam_tag: input.params.tag, fields: input.body, scan, poses: poses ?? null };
        return recordScan(deps, changeContext(deps, input), pushed);
      },
      (remembered) => readScanPage(reader, Remembered.parse(remembered).scan_id),
    ),
    route(contracts.getScan, ({ params }) => readScanPage(reader, params.id)),
    route(contracts.getSection, ({ params, query }) => readSection(deps, params.id, query.station_mm)),
  ];
}
