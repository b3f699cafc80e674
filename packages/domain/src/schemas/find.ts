import { z } from "zod";

export const FOUND_KINDS = ["part", "seam", "lot", "cell", "person", "drawing", "procedure"] as const;

/** One thing that a search found. */
export const Found = z
  .object({
    kind: z.enum(FOUND_KINDS).meta({ description: "What it is" }),
    tag: z.string().nullable().meta({ description: "Tag, when it has one" }),
    id: z.uuid().meta({ description: "Identifier" }),
    title: z.string().meta({ description: "Name to show", example: "Skid frame 0418" }),
    detail: z
      .string()
      .meta({ description: "What tells it from its like", example: "FW-2210 rev C, order 41-2207" }),
  })
  .meta({ id: "Found" });
export type Found = z.infer<typeof Found>;

/** What a search found, best first. */
export const FindAnswer = z
  .object({ items: z.array(Found).meta({ description: "Best match first, 50 at most" }) })
  .meta({ id: "FindAnswer" });
export type FindAnswer = z.infer<typeof FindAnswer>;

/** What a tag is of, and where its page stands. */
export const TagAnswer = Found.extend({
  page: z
    .string()
    .meta({ description: "Path of its page in the web application", example: "/seams/S-8K3F7Q2NS" }),
}).meta({ id: "TagAnswer" });
export type TagAnswer = z.infer<typeof TagAnswer>;
