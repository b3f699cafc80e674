import type { SeamRow } from "@beadroll/domain/schemas/seam";
import type { ReactElement, ReactNode } from "react";
import { Link } from "react-router";
import { pathTo } from "../../app/paths.ts";
import { Sheet } from "../../kit/page/sheet.tsx";
import { InstantText } from "../../kit/units/instant-text.tsx";
import { seamNumber } from "../seams/seam-words.ts";

/** Rows shown before the rest is only counted. */
const SHOWN = 12;

/** Seams that wait for somebody, the longest waiting first. */
export function WaitingSeams(props: {
  title: string;
  seams: readonly SeamRow[];
  count: number;
  none: ReactNode;
}): ReactElement {
  const shown = props.seams.slice(0, SHOWN);
  return (
    <Sheet title={props.title} aside={String(props.count)}>
      {shown.length === 0 ? (
        <p className="text-ash">{props.none}</p>
      ) : (
        <ul>
          {shown.map((seam) => (
            <li
              key={seam.id}
              className="flex items-baseline justify-between gap-3 border-t border-row py-1.5 first:border-t-0"
            >
              <Link to={pathTo("seam", { tag: seam.tag })} className="min-w-0 truncate">
                {seam.part_name} <span className="figures">{seamNumber(seam.number, seam.attempt)}</span>
              </Link>
              <span className="shrink-0 text-sm text-ash">
                <InstantText at={seam.changed_at} />
              </span>
            </li>
          ))}
        </ul>
      )}
      {props.count > shown.length ? (
        <p className="mt-2 text-sm text-ash">and {props.count - shown.length} more</p>
      ) : null}
    </Sheet>
  );
}
