import type { FloorCell } from "@beadroll/domain/schemas/floor";
import type { SeamRow } from "@beadroll/domain/schemas/seam";
import type { ReactElement } from "react";
import { Link } from "react-router";
import { pathTo } from "../../app/paths.ts";
import { StateMark } from "../../kit/states/state-mark.tsx";
import { BeadStrip } from "../../kit/strip/bead-strip.tsx";
import { stationsFromShares } from "../../kit/strip/strip-from-shares.ts";
import { seamNumber } from "../seams/seam-words.ts";
import { lastRecordWords } from "./cell-words.ts";
import { SinceText } from "./since-text.tsx";

interface LatestSeamsProps {
  latest: FloorCell["latest"];
  changed: ReadonlySet<string>;
  now_ms: number;
}

/** What the cell did last, large enough for somebody who stands by it, and the seams before. */
export function LatestSeams(props: LatestSeamsProps): ReactElement {
  const [last, ...before] = props.latest;
  if (last === undefined)
    return (
      <p className="text-ash">
        Here stands what the cell did last. Its computer needs a key for that: an administrator makes it, and{" "}
        <code className="figures">beadroll enrol</code> takes it.
      </p>
    );
  return (
    <>
      <LastSeam seam={last} isChanged={props.changed.has(last.id)} now_ms={props.now_ms} />
      {before.length === 0 ? null : (
        <>
          <h3 className="table-head mt-4 mb-1">Before that</h3>
          <ul>
            {before.map((seam) => (
              <SeamLine key={seam.id} seam={seam} isChanged={props.changed.has(seam.id)} />
            ))}
          </ul>
        </>
      )}
    </>
  );
}

function SeamLink(props: { seam: SeamRow }): ReactElement {
  const { seam } = props;
  return (
    <Link to={pathTo("seam", { tag: seam.tag })}>
      {seam.part_name} {seamNumber(seam.number, seam.attempt)}
    </Link>
  );
}

function LastSeam(props: { seam: SeamRow; isChanged: boolean; now_ms: number }): ReactElement {
  const { seam } = props;
  return (
    <div className={`-mx-[1.125rem] px-[1.125rem] py-2 ${props.isChanged ? "kit-changed" : ""}`}>
      <div className="flex flex-wrap items-baseline justify-between gap-x-4">
        <h3 className="text-[1.625rem] leading-8">
          <SeamLink seam={seam} />
        </h3>
        <span className="text-[1.375rem] leading-8 [&_svg]:size-4">
          <StateMark state={seam.state} />
        </span>
      </div>
      <p className="text-ash">
        {lastRecordWords(seam)} <SinceText at={seam.changed_at} now_ms={props.now_ms} />
      </p>
      {seam.strip === null ? null : (
        <div className="mt-2">
          <BeadStrip
            size="sheet"
            stations={stationsFromShares(seam.strip, seam.length_mm)}
            length_mm={seam.length_mm}
            label={`${seam.part_name} ${seam.number}, share of the limit`}
          />
        </div>
      )}
    </div>
  );
}

function SeamLine(props: { seam: SeamRow; isChanged: boolean }): ReactElement {
  const { seam } = props;
  return (
    <li
      className={`-mx-[1.125rem] grid min-h-11 grid-cols-[minmax(0,1fr)_6.5rem] items-center gap-x-4 border-t border-row px-[1.125rem] sm:grid-cols-[11rem_minmax(0,1fr)_6.5rem] ${props.isChanged ? "kit-changed" : ""}`}
    >
      <span className="truncate">
        <SeamLink seam={seam} />
      </span>
      <div className="max-sm:hidden">
        {seam.strip === null ? (
          <span className="text-sm text-ash">not scanned</span>
        ) : (
          <BeadStrip
            stations={stationsFromShares(seam.strip, seam.length_mm)}
            length_mm={seam.length_mm}
            label={`${seam.part_name} ${seam.number}, share of the limit`}
            tabStop={false}
          />
        )}
      </div>
      <StateMark state={seam.state} />
    </li>
  );
}
