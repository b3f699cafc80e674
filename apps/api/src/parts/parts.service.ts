import type { PartCreate, PartPage, Piece, PieceCreate } from "@beadroll/domain/schemas/part";
import { readDrawing } from "../drawings/drawings.read.ts";
import { refusal } from "../http/refusal.ts";
import { type ChangeContext, type ChangeTrx, change } from "../ledger/change.ts";
import { readLot } from "../lots/lots.read.ts";
import { idOfTag } from "../tags/tag-lookup.ts";
import { readPart, readPartPage, readPieces } from "./parts.read.ts";

async function planSeams(trx: ChangeTrx, partId: string, drawingId: string): Promise<string[]> {
  const models: { id: string }[] = await trx
    .read("model_seams")
    .where({ drawing_id: drawingId })
    .orderBy(["sequence", "number"])
    .select("id");
  const tags: string[] = [];
  for (const model of models) {
    const tag = trx.newTag("S");
    tags.push(tag);
    await trx.insert("seams", {
      id: trx.newId(),
      tag,
      part_id: partId,
      model_seam_id: model.id,
      attempt: 1,
      state: "planned",
      changed_at: trx.at,
    });
  }
  return tags;
}

/**
 * Starts a part; its seams are planned from the drawing's model seams.
 * @throws Refusal conflict when the serial is taken, state-conflict when the drawing is not current, not-found
 */
export function createPart(context: ChangeContext, create: PartCreate): Promise<PartPage> {
  return change(context, "part.create", async (trx) => {
    const drawing = await readDrawing(trx.read, create.drawing_id);
    if (drawing.status !== "current")
      throw refusal(
        "state-conflict",
        `Drawing ${drawing.number} rev ${drawing.revision} is ${drawing.status}, not current.`,
        {
          field: "drawing_id",
        },
      );
    const { serial } = create;
    const twin: { tag: string } | undefined = await trx
      .read("parts")
      .where({ drawing_id: drawing.id, serial })
      .first("tag");
    if (twin !== undefined)
      throw refusal("conflict", `${drawing.title} ${serial} is already recorded as ${twin.tag}.`, {
        field: "serial",
      });
    const parent =
      create.parent_tag === undefined ? null : await idOfTag(trx.read, "P", create.parent_tag, "parent_tag");
    const id = trx.newId();
    const tag = trx.newTag("P");
    await trx.insert("parts", {
      id,
      tag,
      drawing_id: drawing.id,
      serial,
      order_no: create.order_no ?? null,
      parent_part_id: parent,
      created_at: trx.at,
      version: 1,
    });
    const seams = await planSeams(trx, id, drawing.id);
    return {
      value: await readPartPage(trx.read, tag),
      remember: { part_tag: tag },
      subjects: [tag, ...seams],
    };
  });
}

/**
 * Builds a piece into a part; one at the same position is replaced from this moment.
 * @throws Refusal not-found; state-conflict for a lot that is not released or is a consumable
 */
export function addPiece(context: ChangeContext, tag: string, create: PieceCreate): Promise<Piece> {
  return change(context, "piece.create", async (trx) => {
    const part = await readPart(trx.read, tag);
    const lot = await readLot(trx.read, create.lot_tag);
    if (!["plate", "section", "tube"].includes(lot.kind))
      throw refusal("state-conflict", `${lot.tag} is ${lot.kind}; pieces come from plate, section or tube.`, {
        field: "lot_tag",
      });
    if (lot.state !== "released")
      throw refusal(
        "state-conflict",
        `Lot ${lot.number} is ${lot.state.replace("_", " ")}; only released lots are built in.`,
        {
          field: "lot_tag",
        },
      );
    const { position } = create;
    const current: { id: string } | undefined = await trx
      .read("pieces")
      .where({ part_id: part.id, position })
      .whereNull("to_at")
      .first("id");
    if (current) await trx.update("pieces", { id: current.id }, { to_at: trx.at });
    const id = trx.newId();
    await trx.insert("pieces", {
      id,
      part_id: part.id,
      lot_id: lot.id,
      position,
      from_at: trx.at,
      to_at: null,
    });
    const made = (await readPieces(trx.read, part.id)).find((piece) => piece.id === id);
    if (!made) throw new Error("the piece just written cannot be read");
    return { value: made, subjects: [part.tag, lot.tag], facts: { position } };
  });
}
