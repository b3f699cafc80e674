import { z } from "zod";
import { LABEL_LAYOUTS } from "../labels/label-sheets.ts";
import { PageQuery, pageOf } from "../schemas/paging.ts";
import { Part, PartCreate, PartPage, Piece, PieceCreate } from "../schemas/part.ts";
import { contract } from "./contract.ts";
import { TagParams } from "./parameters.ts";

const group = "Parts";

export const PART_SORTS = ["serial", "-serial", "created_at", "-created_at"] as const;

export const listParts = contract({
  method: "get",
  path: "/parts",
  operationId: "listParts",
  summary: "Parts, newest first unless sorted otherwise",
  group,
  access: "records:read",
  query: z.strictObject({
    ...PageQuery,
    drawing_id: z.uuid().optional().meta({ description: "Only parts made to this drawing" }),
    order_no: z
      .string()
      .max(40)
      .optional()
      .meta({ description: "Only parts of this order", example: "41-2207" }),
    serial: z.string().max(40).optional().meta({ description: "Only serials that begin so", example: "04" }),
    with: z
      .enum(["held", "rejected", "welded", "planned"])
      .optional()
      .meta({ description: "Only parts with a seam in this condition", example: "held" }),
    sort: z.enum(PART_SORTS).default("-created_at").meta({ description: "Order of the list" }),
  }),
  answer: { status: 200, description: "A page of parts", schema: pageOf(Part) },
  problems: ["parameter-unknown"],
});

export const createPart = contract({
  method: "post",
  path: "/parts",
  operationId: "createPart",
  summary: "Start a part; its seams are planned from the drawing",
  group,
  access: "parts:write",
  guard: "idempotency-key",
  body: { kind: "json", schema: PartCreate },
  answer: { status: 201, description: "The part with its roll", schema: PartPage },
  problems: ["request-invalid", "tag-invalid", "not-found", "conflict", "state-conflict"],
});

export const getPart = contract({
  method: "get",
  path: "/parts/{tag}",
  operationId: "getPart",
  summary: "A part: its roll of seams and what went in",
  group,
  access: "records:read",
  params: TagParams,
  answer: { status: 200, description: "The part", schema: PartPage },
  problems: ["tag-invalid", "not-found"],
});

export const addPiece = contract({
  method: "post",
  path: "/parts/{tag}/pieces",
  operationId: "addPiece",
  summary: "Build a piece from a lot into a part",
  description: "A piece at the same position is replaced from that moment; the old link stays on the record.",
  group,
  access: "parts:write",
  guard: "idempotency-key",
  params: TagParams,
  body: { kind: "json", schema: PieceCreate },
  answer: { status: 201, description: "The piece", schema: Piece },
  problems: ["request-invalid", "tag-invalid", "not-found", "state-conflict"],
});

export const printLabels = contract({
  method: "get",
  path: "/parts/{tag}/labels",
  operationId: "printLabels",
  summary: "Labels of a part and its seams, as PDF with QR codes",
  group,
  access: "labels:print",
  params: TagParams,
  query: z.strictObject({
    layout: z
      .enum(LABEL_LAYOUTS)
      .default("sheet-a4-3x8")
      .meta({ description: "Sheet of labels, or one label a page" }),
    width_mm: z.coerce
      .number()
      .min(20)
      .max(200)
      .default(62)
      .meta({ description: "Width of a single label, mm" }),
    height_mm: z.coerce
      .number()
      .min(12)
      .max(200)
      .default(29)
      .meta({ description: "Height of a single label, mm" }),
    start: z.coerce
      .number()
      .int()
      .min(1)
      .max(30)
      .default(1)
      .meta({ description: "First free place on a begun sheet" }),
    what: z
      .enum(["all", "part", "seams", "strip"])
      .default("all")
      .meta({ description: "Part and seams, one of them, or one part label with a strip of seam codes" }),
  }),
  answer: { status: 200, description: "PDF", media_type: "application/pdf" },
  problems: ["tag-invalid", "not-found", "parameter-unknown", "request-invalid"],
});
