import { z } from "zod";
import { Cell, CellCreate, Mount, MountCreate } from "../schemas/cell.ts";
import { Floor } from "../schemas/floor.ts";
import { PageQuery, pageOf } from "../schemas/paging.ts";
import { contract } from "./contract.ts";
import { TagParams } from "./parameters.ts";

const group = "Cells";

export const getFloor = contract({
  method: "get",
  path: "/floor",
  operationId: "getFloor",
  summary: "Every cell now, and the seams that wait for a decision",
  group,
  access: "records:read",
  answer: { status: 200, description: "The floor", schema: Floor },
  problems: [],
});

export const listCells = contract({
  method: "get",
  path: "/cells",
  operationId: "listCells",
  summary: "Cells, by name",
  group,
  access: "records:read",
  query: z.strictObject(PageQuery),
  answer: { status: 200, description: "A page of cells", schema: pageOf(Cell) },
  problems: ["parameter-unknown"],
});

export const createCell = contract({
  method: "post",
  path: "/cells",
  operationId: "createCell",
  summary: "Record a cell",
  group,
  access: "cells:write",
  guard: "idempotency-key",
  body: { kind: "json", schema: CellCreate },
  answer: { status: 201, description: "The cell", schema: Cell },
  problems: ["request-invalid", "conflict"],
});

export const getCell = contract({
  method: "get",
  path: "/cells/{tag}",
  operationId: "getCell",
  summary: "A cell",
  group,
  access: "records:read",
  params: TagParams,
  answer: { status: 200, description: "The cell", schema: Cell },
  problems: ["tag-invalid", "not-found"],
});

export const listMounts = contract({
  method: "get",
  path: "/mounts",
  operationId: "listMounts",
  summary: "What was mounted on cells, latest first",
  group,
  access: "records:read",
  query: z.strictObject({
    ...PageQuery,
    cell_tag: z.string().optional().meta({ description: "Only this cell", example: "C-8K3F7Q2N6" }),
  }),
  answer: { status: 200, description: "A page of mounts", schema: pageOf(Mount) },
  problems: ["parameter-unknown", "tag-invalid", "not-found"],
});

export const mountLot = contract({
  method: "post",
  path: "/mounts",
  operationId: "mountLot",
  summary: "Mount a consumable lot on a cell's slot",
  group,
  access: "mounts:write",
  guard: "idempotency-key",
  body: { kind: "json", schema: MountCreate },
  answer: { status: 201, description: "The mount", schema: Mount },
  problems: ["request-invalid", "tag-invalid", "not-found", "state-conflict"],
});
