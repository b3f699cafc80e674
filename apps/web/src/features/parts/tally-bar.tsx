import type { Part } from "@beadroll/domain/schemas/part";
import type { ReactElement } from "react";
import { tallyWords } from "./part-words.ts";

/** Seams of a part by condition, done at the left. Filled: accepted; hatched: welded; open: the rest; the stop colour: held or rejected. */
export function TallyBar(props: { tally: Part["seams"] }): ReactElement {
  const { tally } = props;
  const parts = [
    { key: "accepted", count: tally.accepted, style: "bg-good" },
    { key: "welded", count: tally.welded, style: "bg-ash" },
    { key: "stopped", count: tally.held + tally.rejected, style: "bg-stop" },
    { key: "rest", count: tally.clear + tally.planned, style: "" },
  ];
  return (
    <span className="flex items-center gap-3">
      <span aria-hidden="true" className="flex h-2.5 w-24 shrink-0 border border-edge">
        {parts.map(({ key, count, style }) =>
          count === 0 ? null : (
            <span key={key} className={style} style={{ width: `${(100 * count) / tally.total}%` }} />
          ),
        )}
      </span>
      <span className="text-sm text-ash">{tallyWords(tally)}</span>
    </span>
  );
}
