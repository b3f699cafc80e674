import type { SeamRow } from "@beadroll/domain/schemas/seam";
import type { ReactElement } from "react";
import { Link } from "react-router";
import { pathTo } from "../../app/paths.ts";
import { StateShapeIcon } from "../../kit/states/state-shape.tsx";
import { seamNumber } from "../seams/seam-words.ts";
import { type Waiting, waitingFor } from "./part-words.ts";

/** Seams named before the rest is only counted. */
const NAMED = 8;

const TONES: Readonly<Record<Waiting["tone"], string>> = {
  stop: "text-stop",
  attend: "text-attend",
  plain: "text-ash",
};

/** What must be done with the part now, with the seams it is for. */
export function PartTodo(props: { roll: readonly SeamRow[] }): ReactElement {
  const waiting = waitingFor(props.roll);
  if (waiting.length === 0) return <p className="-mt-3 mb-5">Nothing is left to do on its seams.</p>;
  return (
    <ul className="-mt-2 mb-5 grid gap-1">
      {waiting.map((deed) => (
        <li key={deed.many} className="flex flex-wrap items-baseline gap-x-2">
          <span className={`flex items-baseline gap-2 font-semibold ${TONES[deed.tone]}`}>
            {deed.tone === "plain" ? null : (
              <StateShapeIcon shape={deed.tone === "stop" ? "diamond" : "triangle"} size={12} />
            )}
            {deed.seams.length} {deed.seams.length === 1 ? deed.one : deed.many}:
          </span>
          {deed.seams.slice(0, NAMED).map((seam) => (
            <Link
              key={seam.id}
              to={pathTo("seam", { tag: seam.tag })}
              className="figures inline-block min-w-6 py-0.5 text-center"
            >
              {seamNumber(seam.number, seam.attempt)}
            </Link>
          ))}
          {deed.seams.length > NAMED ? (
            <span className="text-ash">and {deed.seams.length - NAMED} more</span>
          ) : null}
        </li>
      ))}
    </ul>
  );
}
