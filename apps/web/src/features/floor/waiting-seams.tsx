import type { SeamRow } from "@beadroll/domain/schemas/seam";
import type { ReactElement } from "react";
import { Link } from "react-router";
import { pathTo } from "../../app/paths.ts";
import { Sheet } from "../../kit/page/sheet.tsx";
import { StateMark } from "../../kit/states/state-mark.tsx";
import type { StateName } from "../../kit/states/state-words.ts";
import { seamNumber } from "../seams/seam-words.ts";
import { SinceText } from "./since-text.tsx";

/** Rows shown before the rest is only counted. */
const SHOWN = 12;

export interface WaitingSeamsProps {
  title: string;
  /** The state they wait in; it stands beside their number. */
  state: StateName;
  /** Who has to do what, while there are any. */
  todo: string;
  /** What is said when none waits. */
  none: string;
  seams: readonly SeamRow[];
  count: number;
  /** The key under which the count is marked when it changes. */
  countKey: string;
  /** Where all of them are. */
  all: { readonly to: string; readonly words: string };
  changed: ReadonlySet<string>;
  now_ms: number;
}

/** Seams that wait for somebody, the longest waiting first. */
export function WaitingSeams(props: WaitingSeamsProps): ReactElement {
  const shown = props.seams.slice(0, SHOWN);
  return (
    <Sheet
      title={props.title}
      aside={
        props.count === 0 ? undefined : (
          <span
            className={`-mr-2 px-2 py-1 text-lg ${props.changed.has(props.countKey) ? "kit-changed" : ""}`}
          >
            <StateMark state={props.state} word={String(props.count)} />
          </span>
        )
      }
    >
      <p className="mb-2 text-ash">{props.count === 0 ? props.none : props.todo}</p>
      <ul>
        {shown.map((seam) => (
          <li
            key={seam.id}
            className={`-mx-[1.125rem] flex min-h-11 items-center justify-between gap-3 border-t border-row px-[1.125rem] ${props.changed.has(seam.id) ? "kit-changed" : ""}`}
          >
            <Link to={pathTo("seam", { tag: seam.tag })} className="min-w-0 truncate py-2">
              {seam.part_name} {seamNumber(seam.number, seam.attempt)}
            </Link>
            <span className="shrink-0 text-sm text-ash">
              <SinceText at={seam.changed_at} now_ms={props.now_ms} />
            </span>
          </li>
        ))}
      </ul>
      {props.count > shown.length ? (
        <p className="border-t border-row pt-2.5">
          <span className="text-ash">{props.count - shown.length} more · </span>
          <Link to={props.all.to}>{props.all.words}</Link>
        </p>
      ) : null}
    </Sheet>
  );
}
