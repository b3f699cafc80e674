import type { WentIn as WentInRow } from "@beadroll/domain/schemas/part";
import { parseTag } from "@beadroll/domain/tags/parse-tag";
import { tagKind } from "@beadroll/domain/tags/tag";
import type { ReactElement } from "react";
import { pathTo } from "../../app/paths.ts";
import { KeyValue } from "../../kit/page/key-value.tsx";
import { TagText } from "../../kit/page/tag-text.tsx";

/** Where a tag's page is, for the kinds that have one. */
function pageOf(text: string | null): string | undefined {
  const tag = text === null ? null : parseTag(text);
  if (!tag?.ok) return undefined;
  const kind = tagKind(tag.value);
  if (kind === "L") return pathTo("lot", { tag: tag.value });
  return kind === "W" ? pathTo("person", { tag: tag.value }) : undefined;
}

/** What the part is made of and who made it: pieces, consumables, procedures, operators. */
export function WentIn(props: { rows: readonly WentInRow[] }): ReactElement {
  if (props.rows.length === 0)
    return (
      <p className="text-ash">
        Nothing yet. Pieces come with their heats; wire, gas, procedure and operator come with the passes.
      </p>
    );
  return (
    <KeyValue
      rows={props.rows.map((row) => {
        const to = pageOf(row.tag);
        return {
          key: row.role,
          value: (
            <span>
              <TagText text={row.name} {...(to !== undefined && { to })} />
              {row.detail === null ? null : <span className="ml-2 text-sm text-ash">{row.detail}</span>}
              {row.seam_count > 0 ? (
                <span className="ml-2 text-sm text-ash">
                  {row.seam_count} {row.seam_count === 1 ? "seam" : "seams"}
                </span>
              ) : null}
            </span>
          ),
        };
      })}
    />
  );
}
