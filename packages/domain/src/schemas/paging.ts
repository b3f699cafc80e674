import { z } from "zod";

/** Largest number of items one page may carry. */
export const PAGE_LIMIT_MAX = 500;

/** The paging part of every list's query. */
export const PageQuery = {
  limit: z.coerce.number().int().min(1).max(PAGE_LIMIT_MAX).default(100).meta({
    description: "Largest number of items to answer with",
    example: 100,
  }),
  cursor: z.string().max(400).optional().meta({
    description: "Where to go on: `next_cursor` of the page before",
    example: "eyJrIjoiMDQxOCJ9",
  }),
};

/** A page of items; `next_cursor` is null on the last. */
export const pageOf = <T extends z.ZodType>(item: T) =>
  z.object({
    items: z.array(item).meta({ description: "The items, in the order asked for" }),
    next_cursor: z.string().nullable().meta({ description: "Cursor of the next page, null on the last" }),
  });
