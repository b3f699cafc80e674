import type { FloorCell } from "@beadroll/domain/schemas/floor";
import type { ReactElement } from "react";
import { Link } from "react-router";
import { pathTo } from "../../app/paths.ts";
import { KeyValue } from "../../kit/page/key-value.tsx";
import { Sheet } from "../../kit/page/sheet.tsx";
import { TagText } from "../../kit/page/tag-text.tsx";
import { StateMark } from "../../kit/states/state-mark.tsx";
import { BeadStrip } from "../../kit/strip/bead-strip.tsx";
import { stationsFromShares } from "../../kit/strip/strip-from-shares.ts";
import { InstantText } from "../../kit/units/instant-text.tsx";
import { seamNumber } from "../seams/seam-words.ts";

const SLOT_WORDS = { wire: "Wire", gas: "Gas", flux: "Flux" } as const;

/** A cell: what it did today, what is mounted, what it worked on last. */
export function CellSheet(props: { floor: FloorCell; changed: ReadonlySet<string> }): ReactElement {
  const { cell, mounts, today, latest, last_event_at } = props.floor;
  return (
    <Sheet
      title={cell.name}
      aside={
        last_event_at === null ? (
          "nothing sent yet"
        ) : (
          <>
            last heard <InstantText at={last_event_at} />
          </>
        )
      }
    >
      <dl className="mb-4 grid grid-cols-3 gap-3 border-b border-row pb-4">
        <Count word="Scans today" count={today.scans} />
        <Count word="Passes today" count={today.passes} />
        <Count word="Holds today" count={today.holds} isStop={today.holds > 0} />
      </dl>
      <KeyValue
        rows={[
          ...mounts.map((mount) => ({
            key: SLOT_WORDS[mount.slot],
            value: <TagText text={mount.lot_number} to={pathTo("lot", { tag: mount.lot_tag })} />,
          })),
          { key: "Scanner", value: cell.scanner },
          { key: "Tag", value: <TagText text={cell.tag} /> },
        ]}
      />
      {mounts.length === 0 ? (
        <p className="mt-2 text-attend">
          No wire or gas is mounted: what is welded now is linked to no consumable lot.
        </p>
      ) : null}
      <LatestSeams latest={latest} changed={props.changed} />
    </Sheet>
  );
}

function Count(props: { word: string; count: number; isStop?: boolean }): ReactElement {
  return (
    <div className="flex flex-col-reverse">
      <dt className="text-sm text-ash">{props.word}</dt>
      <dd
        className={`font-display text-page leading-none font-semibold ${props.isStop === true ? "text-stop" : ""}`}
      >
        {props.isStop === true ? <span aria-hidden="true">◆ </span> : null}
        {props.count}
      </dd>
    </div>
  );
}

function LatestSeams(props: {
  latest: FloorCell["latest"];
  changed: ReadonlySet<string>;
}): ReactElement | null {
  if (props.latest.length === 0) return null;
  return (
    <>
      <h3 className="mt-4 mb-1 text-base">Worked on last</h3>
      <ul>
        {props.latest.map((seam) => (
          <li
            key={seam.id}
            className={`grid grid-cols-[minmax(0,1fr)_auto] items-center gap-x-4 border-t border-row py-1.5 sm:grid-cols-[11rem_minmax(0,1fr)_6.5rem] ${props.changed.has(seam.id) ? "bg-hush" : ""}`}
          >
            <Link to={pathTo("seam", { tag: seam.tag })} className="truncate">
              {seam.part_name} <span className="figures">{seamNumber(seam.number, seam.attempt)}</span>
            </Link>
            <div className="max-sm:hidden">
              {seam.strip === null ? (
                <span className="text-sm text-ash">not scanned</span>
              ) : (
                <BeadStrip
                  stations={stationsFromShares(seam.strip, seam.length_mm)}
                  label={`${seam.part_name} ${seam.number}`}
                  tabStop={false}
                />
              )}
            </div>
            <StateMark state={seam.state} />
          </li>
        ))}
      </ul>
    </>
  );
}
