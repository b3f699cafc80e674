import { parseTag } from "@beadroll/domain/tags/parse-tag";
import { TAG_KINDS, type Tag, type TagKind, tagKind } from "@beadroll/domain/tags/tag";
import { stopOnFaults } from "../output/fault-text.ts";

/** A tag given on the command line, checked before anything is sent. Stops with exit code 2 and the place of doubt. */
export function tagOption(option: string, text: string, kind: TagKind): Tag {
  const tag = parseTag(text);
  if (!tag.ok) return stopOnFaults(tag.faults.map((fault) => ({ ...fault, field: option })));
  const found = tagKind(tag.value);
  if (found === kind) return tag.value;
  const detail = `${tag.value} is the tag of a ${TAG_KINDS[found]}; expected one of a ${TAG_KINDS[kind]}.`;
  return stopOnFaults([{ code: "tag-invalid", field: option, detail }]);
}

/** The same for an option that may be left out. */
export function tagOptionIfGiven(option: string, text: string | undefined, kind: TagKind): Tag | undefined {
  return text === undefined ? undefined : tagOption(option, text, kind);
}
