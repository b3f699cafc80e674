import { z } from "zod";

/** Path parameter: a tag as read from a label; case and O/0, I/1 confusions are forgiven. */
export const TagParams = z.object({
  tag: z.string().min(3).max(200).meta({ description: "Tag", example: "S-8K3F7Q2NS" }),
});

/** Path parameter: an identifier. */
export const IdParams = z.object({
  id: z.uuid().meta({ description: "Identifier", example: "0193782a-5c1e-7c3a-9d52-6b1f0e4c8a77" }),
});

const MIB = 1024 * 1024;

/** Largest scan or poses file. */
export const SCAN_MAX_BYTES = 256 * MIB;
/** Largest weld log. */
export const LOG_MAX_BYTES = 64 * MIB;
/** Largest certificate, photo or other document. */
export const DOCUMENT_MAX_BYTES = 32 * MIB;
