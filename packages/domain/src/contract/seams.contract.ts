import { z } from "zod";
import { CorrectedPath } from "../schemas/corrected-path.ts";
import { FillAdvice } from "../schemas/fill-advice.ts";
import { Inspection, InspectionCreate } from "../schemas/inspection.ts";
import { PageQuery, pageOf } from "../schemas/paging.ts";
import { PassCreate, PassRecord } from "../schemas/pass.ts";
import { ScanCreate, ScanPage } from "../schemas/scan.ts";
import { VERDICTS } from "../schemas/scan-result.ts";
import { SEAM_STATES, SeamPage, SeamRow } from "../schemas/seam.ts";
import { SectionView } from "../schemas/section-view.ts";
import { contract } from "./contract.ts";
import { IdParams, LOG_MAX_BYTES, SCAN_MAX_BYTES, TagParams } from "./parameters.ts";

export const listSeams = contract({
  method: "get",
  path: "/seams",
  operationId: "listSeams",
  summary: "Seams over all parts, last changed first",
  group: "Seams",
  access: "records:read",
  query: z.strictObject({
    ...PageQuery,
    state: z.enum(SEAM_STATES).optional().meta({ description: "Only this state" }),
    verdict: z.enum(VERDICTS).optional().meta({ description: "Only this verdict" }),
    drawing_id: z.uuid().optional().meta({ description: "Only seams of parts made to this drawing" }),
    model_seam_id: z.uuid().optional().meta({ description: "Only seams made to this model seam" }),
  }),
  answer: { status: 200, description: "A page of seams", schema: pageOf(SeamRow) },
  problems: ["parameter-unknown"],
});

export const getSeam = contract({
  method: "get",
  path: "/seams/{tag}",
  operationId: "getSeam",
  summary: "A seam's whole record",
  group: "Seams",
  access: "records:read",
  params: TagParams,
  answer: { status: 200, description: "The seam", schema: SeamPage },
  problems: ["tag-invalid", "not-found"],
});

export const pushScan = contract({
  method: "post",
  path: "/seams/{tag}/scans",
  operationId: "pushScan",
  summary: "Record a scan of a seam; answers with the verdict",
  description:
    "Send the scan as the file part `scan`, and `poses` beside it when it is profiles. The server measures it against the model of the seam, judges it and keeps the files by digest. The same files again answer with the first record.",
  group: "Scans",
  access: "scans:write",
  guard: "idempotency-key",
  params: TagParams,
  body: {
    kind: "multipart",
    schema: ScanCreate,
    files: {
      scan: {
        description: "Profiles (CSV, JSON) or a cloud (PLY, PCD, XYZ)",
        required: true,
        max_bytes: SCAN_MAX_BYTES,
      },
      poses: { description: "Poses of the profiles (CSV)", required: false, max_bytes: SCAN_MAX_BYTES },
    },
  },
  answer: { status: 201, description: "The scan with everything measured", schema: ScanPage },
  problems: [
    "request-invalid",
    "tag-invalid",
    "not-found",
    "seam-of-other-part",
    "state-conflict",
    "file-empty",
    "file-truncated",
    "file-format-unknown",
    "file-header-invalid",
    "file-column-missing",
    "file-value-invalid",
    "file-too-large",
    "scan-units-implausible",
    "scan-too-few-points",
    "scan-poses-missing",
    "scan-pose-invalid",
    "busy",
  ],
});

export const getScan = contract({
  method: "get",
  path: "/scans/{id}",
  operationId: "getScan",
  summary: "A scan with everything measured",
  group: "Scans",
  access: "records:read",
  params: IdParams,
  answer: { status: 200, description: "The scan", schema: ScanPage },
  problems: ["not-found"],
});

export const getSection = contract({
  method: "get",
  path: "/scans/{id}/section",
  operationId: "getSection",
  summary: "The cross-section of a scan at a station",
  description: "Points kept and rejected, fitted plates, root and the model's outline, in the section frame.",
  group: "Scans",
  access: "records:read",
  params: IdParams,
  query: z.strictObject({
    station_mm: z.coerce.number().meta({ description: "Station along the seam, mm", example: 120 }),
  }),
  answer: { status: 200, description: "The section", schema: SectionView },
  problems: ["not-found", "parameter-unknown"],
});

export const getScanCloud = contract({
  method: "get",
  path: "/scans/{id}/cloud",
  operationId: "getScanCloud",
  summary: "The points of a scan, thinned, to be drawn",
  description:
    "Little-endian: uint32 points of the scan, uint32 points that follow, then x, y, z of each as float32, mm, part frame. At most 200,000 points, evenly thinned; the whole scan is its file.",
  group: "Scans",
  access: "records:read",
  params: IdParams,
  answer: { status: 200, description: "The points", media_type: "application/octet-stream" },
  problems: ["not-found"],
});

export const getCorrectedPath = contract({
  method: "get",
  path: "/scans/{id}/path",
  operationId: "getCorrectedPath",
  summary: "The nominal line moved to the joint as scanned, with tool axis",
  description:
    "Advice for the welding coordinator, no command to a robot. Stations not measured are left out.",
  group: "Scans",
  access: "records:read",
  params: IdParams,
  answer: { status: 200, description: "The path", schema: CorrectedPath },
  problems: ["not-found", "scan-not-fitup"],
});

export const getCorrectedPathCsv = contract({
  method: "get",
  path: "/scans/{id}/path.csv",
  operationId: "getCorrectedPathCsv",
  summary: "The same path as CSV",
  group: "Scans",
  access: "records:read",
  params: IdParams,
  answer: { status: 200, description: "One row a point", media_type: "text/csv" },
  problems: ["not-found", "scan-not-fitup"],
});

export const getFillAdvice = contract({
  method: "get",
  path: "/scans/{id}/fill",
  operationId: "getFillAdvice",
  summary: "The fill that the measured gap asks for, and the travel speed that gives it",
  description:
    "Advice for the welding coordinator: area, travel speed at the same wire feed and resulting heat input at each station, held against the seam's procedure.",
  group: "Scans",
  access: "records:read",
  params: IdParams,
  answer: { status: 200, description: "The advice", schema: FillAdvice },
  problems: ["not-found", "scan-not-fitup", "procedure-incomplete"],
});

export const pushPass = contract({
  method: "post",
  path: "/seams/{tag}/passes",
  operationId: "pushPass",
  summary: "Record a weld run with its log; answers with what the log says",
  group: "Passes",
  access: "passes:write",
  guard: "idempotency-key",
  params: TagParams,
  body: {
    kind: "multipart",
    schema: PassCreate,
    files: { log: { description: "The log (CSV or JSON)", required: true, max_bytes: LOG_MAX_BYTES } },
  },
  answer: { status: 201, description: "The pass with its log reduced", schema: PassRecord },
  problems: [
    "request-invalid",
    "tag-invalid",
    "not-found",
    "seam-of-other-part",
    "state-conflict",
    "conflict",
    "file-empty",
    "file-truncated",
    "file-format-unknown",
    "file-header-invalid",
    "file-column-missing",
    "file-value-invalid",
    "file-too-large",
    "log-clock-reset",
    "log-no-arc",
  ],
});

export const recordInspection = contract({
  method: "post",
  path: "/seams/{tag}/inspections",
  operationId: "recordInspection",
  summary: "Record an inspection of a seam",
  group: "Inspections",
  access: "inspections:write",
  guard: "idempotency-key",
  params: TagParams,
  body: { kind: "json", schema: InspectionCreate },
  answer: { status: 201, description: "The inspection", schema: Inspection },
  problems: ["request-invalid", "tag-invalid", "not-found", "state-conflict"],
});
