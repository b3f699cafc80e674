import { Readable } from "node:stream";
import * as contracts from "@beadroll/domain/contract/seams.contract";
import { pathCsv } from "@beadroll/domain/measure/path/corrected-path";
import { z } from "zod";
import { changeContext, type Deps } from "../deps.ts";
import { refusal } from "../http/refusal.ts";
import { type Route, route } from "../http/route.ts";
import { readCorrectedPath, readFillAdvice } from "./scan-advice.ts";
import { readScanPage } from "./scans.read.ts";
import { readScanCloud, readSection, recordScan } from "./scans.service.ts";

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
    route(contracts.getScanCloud, async ({ params }) => ({
      stream: Readable.from([Buffer.from(await readScanCloud(deps, params.id))]),
      media_type: "application/octet-stream",
      file_name: `cloud-${params.id}.bin`,
      inline: false,
    })),
    route(contracts.getCorrectedPath, ({ params }) => readCorrectedPath(reader, params.id)),
    route(contracts.getCorrectedPathCsv, async ({ params }) => {
      const path = await readCorrectedPath(reader, params.id);
      return {
        stream: Readable.from([pathCsv(path)]),
        media_type: "text/csv",
        file_name: `path-${params.id}.csv`,
        inline: false,
      };
    }),
    route(contracts.getFillAdvice, ({ params }) => readFillAdvice(reader, params.id)),
    route(contracts.getSection, ({ params, query }) => readSection(deps, params.id, query.station_mm)),
  ];
}
