import { z } from "zod";
import { digest, instant } from "./quantities.ts";

/** A file of the content-addressed store. */
export const StoredFile = z
  .object({
    digest: digest("SHA-256 of the bytes; the file's address"),
    name: z.string().meta({ description: "Name it came with", example: "A-77120.pdf" }),
    media_type: z.string().meta({ description: "Media type", example: "application/pdf" }),
    size: z.int().meta({ description: "Bytes", example: 48211 }),
    created_at: instant("When it came"),
  })
  .meta({ id: "StoredFile" });
export type StoredFile = z.infer<typeof StoredFile>;
