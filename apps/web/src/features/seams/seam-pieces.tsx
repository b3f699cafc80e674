import type { SeamPage } from "@beadroll/domain/schemas/seam";
import type { ReactElement } from "react";
import { pathTo } from "../../app/paths.ts";
import { KeyValue } from "../../kit/page/key-value.tsx";
import { TagText } from "../../kit/page/tag-text.tsx";

/** The pieces of the part that this seam is on. */
export function SeamPieces(props: { page: SeamPage }): ReactElement {
  const { pieces } = props.page;
  if (pieces.length === 0) return <p className="text-ash">No piece is recorded for this part.</p>;
  return (
    <KeyValue
      rows={pieces.map((piece) => ({
        key: piece.position,
        value: (
          <span>
            <TagText text={piece.lot_number} to={pathTo("lot", { tag: piece.lot_tag })} />{" "}
            <span className="text-ash">{piece.grade}</span>
          </span>
        ),
      }))}
    />
  );
}
