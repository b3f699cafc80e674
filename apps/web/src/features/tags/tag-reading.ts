import { parseTag } from "@beadroll/domain/tags/parse-tag";
import { TAG_KINDS, TAG_TAIL_LENGTH, type Tag, tagKind } from "@beadroll/domain/tags/tag";
import { findTagDoubt } from "@beadroll/domain/tags/tag-doubt";

/** Why a tag leads nowhere: in words, and where it can be known the place of doubt. */
export interface TagFault {
  readonly heading: string;
  readonly why: string;
  readonly todo: string;
  readonly doubt: TagPlaces | null;
}

/** A mistyped tag as it was read, the doubtful characters, and what it would be if only they are wrong. */
export interface TagPlaces {
  /** Ten letters and digits, the kind letter first. */
  readonly symbols: string;
  /** 0-based places in `symbols`. */
  readonly places: readonly number[];
  readonly suggestion: Tag;
}

const READ_AGAIN = "Read the label again, or scan it. Mend the code here, then open it.";

/** What is wrong with a text as a tag, before anything is looked up; the tag itself when nothing is. */
export function readTag(
  text: string,
): { readonly ok: true; readonly tag: Tag } | { readonly ok: false; readonly fault: TagFault } {
  const read = parseTag(text);
  if (read.ok) return { ok: true, tag: read.value };
  return {
    ok: false,
    fault: {
      heading: "This tag is mistyped",
      why: read.faults.map(({ detail }) => detail).join(" "),
      todo: READ_AGAIN,
      doubt: tagPlaces(text),
    },
  };
}

/** The place of doubt of a mistyped tag, as far as one slip explains it. */
export function tagPlaces(text: string): TagPlaces | null {
  const symbols = symbolsOf(text);
  if (symbols.length !== TAG_TAIL_LENGTH + 1) return null;
  const doubt = findTagDoubt(symbols);
  return doubt === undefined ? null : { symbols, places: doubt.places, suggestion: doubt.suggestion };
}

/** Letters and digits as the domain reads them, look-alikes folded; what is no letter or digit stands for a doubt. */
function symbolsOf(text: string): string {
  const bare = text.replace(/[\s-]/g, "").toUpperCase();
  return bare.slice(0, 1).replace(/[1I]/, "L") + bare.slice(1).replace(/O/g, "0").replace(/[IL]/g, "1");
}

/** A tag that is right in itself, but that nothing here has. */
export function unknownTag(tag: Tag): TagFault {
  const kind = tagKind(tag);
  if (kind === "K")
    return {
      heading: "A record pack has no page",
      why: "This is the tag of a record pack: a file that proves itself without this server.",
      todo: "Find the file and check it with “beadroll verify FILE”. Its cover names the part; the part's page is here.",
      doubt: null,
    };
  return {
    heading: `No ${TAG_KINDS[kind]} here has this tag`,
    why: `The code is whole, so it was read rightly; but no ${TAG_KINDS[kind]} on this server has it.`,
    todo: "See whether the label is of this shop: another system prints tags of its own. If it is, tell whoever printed it. Search by serial, heat or name meanwhile.",
    doubt: null,
  };
}
