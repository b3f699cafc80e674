import { parseTag } from "@beadroll/domain/tags/parse-tag";
import { TAG_KINDS, type TagKind, tagKind } from "@beadroll/domain/tags/tag";
import type { Knex } from "knex";
import { accepted, refusal } from "../http/refusal.ts";

const TABLES = { P: "parts", S: "seams", L: "lots", C: "cells", W: "people" } as const satisfies Partial<
  Record<TagKind, string>
>;

/** Kinds of tag that stand on a table's rows. */
export type RowTagKind = keyof typeof TABLES;

/**
 * A tag as typed or scanned, of the kind that is wanted, in its written form.
 * @throws Refusal tag-invalid for a mistyped tag or one of another kind
 */
export function tagOf(kind: RowTagKind, text: string, field = "tag"): string {
  const tag = accepted(parseTag(text));
  const found = tagKind(tag);
  if (found !== kind)
    throw refusal(
      "tag-invalid",
      `${tag} is the tag of a ${TAG_KINDS[found]}; expected one of a ${TAG_KINDS[kind]}.`,
      { field },
    );
  return tag;
}

/** The id behind a tag. @throws Refusal tag-invalid, or not-found for a right tag that nothing here has */
export async function idOfTag(db: Knex, kind: RowTagKind, text: string, field = "tag"): Promise<string> {
  const tag = tagOf(kind, text, field);
  const row: { id: string } | undefined = await db(TABLES[kind]).where({ tag }).first("id");
  if (row === undefined)
    throw refusal("not-found", `No ${TAG_KINDS[kind]} here has the tag ${tag}.`, { field });
  return row.id;
}
