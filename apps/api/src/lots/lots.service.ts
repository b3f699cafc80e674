import type { Certificate, CertificateCreate, Lot, LotCreate, LotPatch } from "@beadroll/domain/schemas/lot";
import { refuseStale } from "../db/version.ts";
import { refusal } from "../http/refusal.ts";
import { type ChangeContext, change } from "../ledger/change.ts";
import { readCertificates, readLot } from "./lots.read.ts";

/** Receives a lot. @throws Refusal conflict when this supplier's number is already here */
export function createLot(context: ChangeContext, create: LotCreate): Promise<Lot> {
  return change(context, "lot.create", async (trx) => {
    const { kind, number, supplier } = create;
    const twin: { tag: string } | undefined = await trx
      .read("lots")
      .where({ kind, number, supplier })
      .first("tag");
    if (twin !== undefined)
      throw refusal("conflict", `The ${kind} lot ${number} of ${supplier} is already here as ${twin.tag}.`, {
        field: "number",
      });
    const tag = trx.newTag("L");
    await trx.insert("lots", {
      id: trx.newId(),
      tag,
      ...create,
      dimension: create.dimension ?? null,
      thickness_mm: create.thickness_mm ?? null,
      note: create.note ?? "",
      state: "received",
      created_at: trx.at,
      version: 1,
    });
    return { value: await readLot(trx.read, tag), subjects: [tag] };
  });
}

/** Changes a lot's state or note. @throws Refusal not-found, version-stale */
export function patchLot(
  context: ChangeContext,
  tag: string,
  patch: LotPatch,
  seenVersion: number,
): Promise<Lot> {
  return change(context, "lot.change", async (trx) => {
    const lot = await readLot(trx.read, tag);
    refuseStale(lot, seenVersion);
    await trx.update(
      "lots",
      { id: lot.id },
      {
        version: lot.version + 1,
        ...(patch.state !== undefined && { state: patch.state }),
        ...(patch.note !== undefined && { note: patch.note }),
      },
    );
    return { value: await readLot(trx.read, lot.tag), subjects: [lot.tag] };
  });
}

/** Records a certificate. @throws Refusal not-found for the lot or its file, conflict when its number is recorded */
export function addCertificate(
  context: ChangeContext,
  tag: string,
  create: CertificateCreate,
): Promise<Certificate> {
  return change(context, "certificate.create", async (trx) => {
    const lot = await readLot(trx.read, tag);
    const twin: unknown = await trx
      .read("certificates")
      .where({ lot_id: lot.id, number: create.number })
      .first("id");
    if (twin !== undefined)
      throw refusal("conflict", `Certificate ${create.number} of this lot is already recorded.`, {
        field: "number",
      });
    const digest = create.file_digest ?? null;
    const known: unknown = digest === null ? true : await trx.read("files").where({ digest }).first("digest");
    if (known === undefined)
      throw refusal("not-found", "No stored file has that digest; send the document to /files first.", {
        field: "file_digest",
      });
    const id = trx.newId();
    await trx.insert("certificates", {
      id,
      lot_id: lot.id,
      type: create.type,
      number: create.number,
      issuer: create.issuer,
      issued_on: create.issued_on,
      chemistry: JSON.stringify(create.chemistry ?? {}),
      mechanical: JSON.stringify(create.mechanical ?? {}),
      file_digest: digest,
      created_at: trx.at,
    });
    const certificates = await readCertificates(trx.read, lot.id);
    const made = certificates.find((certificate) => certificate.id === id);
    if (!made) throw new Error("the certificate just written cannot be read");
    return { value: made, subjects: [lot.tag] };
  });
}
