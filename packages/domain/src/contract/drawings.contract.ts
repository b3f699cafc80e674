import { z } from "zod";
import {
  Drawing,
  DrawingCreate,
  DrawingPage,
  DrawingPatch,
  ModelSeam,
  ModelSeamCreate,
  ModelSeamPatch,
} from "../schemas/drawing.ts";
import { PageQuery, pageOf } from "../schemas/paging.ts";
import { SeamModel } from "../schemas/seam-model.ts";
import { contract } from "./contract.ts";
import { IdParams } from "./parameters.ts";

const group = "Drawings and model seams";

export const listDrawings = contract({
  method: "get",
  path: "/drawings",
  operationId: "listDrawings",
  summary: "Drawings, by number and revision",
  group,
  access: "records:read",
  query: z.strictObject({
    ...PageQuery,
    status: Drawing.shape.status.optional().meta({ description: "Only drawings in this status" }),
  }),
  answer: { status: 200, description: "A page of drawings", schema: pageOf(Drawing) },
  problems: ["parameter-unknown"],
});

export const createDrawing = contract({
  method: "post",
  path: "/drawings",
  operationId: "createDrawing",
  summary: "Record a drawing or a new revision",
  group,
  access: "drawings:write",
  guard: "idempotency-key",
  body: { kind: "json", schema: DrawingCreate },
  answer: { status: 201, description: "The drawing", schema: Drawing },
  problems: ["request-invalid", "conflict"],
});

export const getDrawing = contract({
  method: "get",
  path: "/drawings/{id}",
  operationId: "getDrawing",
  summary: "A drawing with its model seams",
  group,
  access: "records:read",
  params: IdParams,
  answer: { status: 200, description: "The drawing", schema: DrawingPage },
  problems: ["not-found"],
});

export const patchDrawing = contract({
  method: "patch",
  path: "/drawings/{id}",
  operationId: "patchDrawing",
  summary: "Change a drawing's title or status",
  group,
  access: "drawings:write",
  guard: "if-match",
  params: IdParams,
  body: { kind: "json", schema: DrawingPatch },
  answer: { status: 200, description: "The drawing as it is now", schema: Drawing },
  problems: ["request-invalid", "not-found", "version-stale", "version-required"],
});

export const createModelSeam = contract({
  method: "post",
  path: "/drawings/{id}/model-seams",
  operationId: "createModelSeam",
  summary: "Add a model seam to a drawing",
  description: "Parts made to the drawing before keep the seams they have.",
  group,
  access: "drawings:write",
  guard: "idempotency-key",
  params: IdParams,
  body: { kind: "json", schema: ModelSeamCreate },
  answer: { status: 201, description: "The model seam", schema: ModelSeam },
  problems: ["request-invalid", "model-invalid", "not-found", "conflict"],
});

export const getModelSeam = contract({
  method: "get",
  path: "/model-seams/{id}",
  operationId: "getModelSeam",
  summary: "A model seam",
  group,
  access: "records:read",
  params: IdParams,
  answer: { status: 200, description: "The model seam", schema: ModelSeam },
  problems: ["not-found"],
});

export const getSeamModel = contract({
  method: "get",
  path: "/model-seams/{id}/model",
  operationId: "getSeamModel",
  summary: "The model of a model seam: nominal line, section and limits",
  description: "The same layout that `beadroll evaluate --model` takes.",
  group,
  access: "records:read",
  params: IdParams,
  answer: { status: 200, description: "The model", schema: SeamModel },
  problems: ["not-found"],
});

export const patchModelSeam = contract({
  method: "patch",
  path: "/model-seams/{id}",
  operationId: "patchModelSeam",
  summary: "Change a model seam's limits, procedure or plan",
  group,
  access: "drawings:write",
  guard: "if-match",
  params: IdParams,
  body: { kind: "json", schema: ModelSeamPatch },
  answer: { status: 200, description: "The model seam as it is now", schema: ModelSeam },
  problems: ["request-invalid", "not-found", "version-stale", "version-required"],
});
