import { SLOTS } from "@beadroll/domain/schemas/cell";
import type { FloorCell } from "@beadroll/domain/schemas/floor";
import type { ReactElement } from "react";
import { Link } from "react-router";
import { pathTo } from "../../app/paths.ts";
import { KeyValue } from "../../kit/page/key-value.tsx";
import { Sheet } from "../../kit/page/sheet.tsx";
import { TagText } from "../../kit/page/tag-text.tsx";
import { StateMark } from "../../kit/states/state-mark.tsx";
import { StateShapeIcon } from "../../kit/states/state-shape.tsx";
import { LengthText } from "../../kit/units/length-text.tsx";
import { cellState, missingWords, SLOT_WORDS } from "./cell-words.ts";
import { countKey, mountKey } from "./floor-values.ts";
import { LatestSeams } from "./latest-seams.tsx";
import { SinceText } from "./since-text.tsx";

interface CellSheetProps {
  floor: FloorCell;
  changed: ReadonlySet<string>;
  now_ms: number;
}

/** A cell: its state, its day in numbers, what it did last, what is mounted. The upper half is read from two metres. */
export function CellSheet(props: CellSheetProps): ReactElement {
  const { cell, latest } = props.floor;
  const { tone, word } = cellState(props.floor, props.now_ms);
  return (
    <Sheet
      title={
        <Link
          to={`?${new URLSearchParams({ cell: cell.tag }).toString()}`}
          className="text-[2rem] leading-10 text-ink no-underline hover:underline"
        >
          {cell.name}
        </Link>
      }
      aside={
        <span className="text-[1.5rem] leading-10 [&_svg]:size-5">
          <StateMark tone={tone} word={word} />
        </span>
      }
    >
      <Day {...props} />
      <LatestSeams latest={latest} changed={props.changed} now_ms={props.now_ms} />
      <Mounted floor={props.floor} changed={props.changed} />
    </Sheet>
  );
}

/** The day's counts, as the server counts it: from midnight UTC. */
function Day(props: CellSheetProps): ReactElement {
  const { cell, today, last_event_at } = props.floor;
  const isChanged = (count: keyof typeof today) => props.changed.has(countKey(cell, count));
  return (
    <div className="mb-1 border-b border-row pb-3">
      <dl className="grid grid-cols-3 gap-3">
        <Count word="scans" count={today.scans} isChanged={isChanged("scans")} />
        <Count word="holds" count={today.holds} isStop isChanged={isChanged("holds")} />
        <Count word="passes" count={today.passes} isChanged={isChanged("passes")} />
      </dl>
      <p className="mt-2 text-ash">
        {last_event_at === null ? (
          "Nothing was sent yet"
        ) : (
          <>
            Last record <SinceText at={last_event_at} now_ms={props.now_ms} />
          </>
        )}
      </p>
    </div>
  );
}

function Count(props: { word: string; count: number; isStop?: boolean; isChanged: boolean }): ReactElement {
  const isStop = props.isStop === true && props.count > 0;
  return (
    <div className={`-ml-2.5 flex flex-col-reverse pl-2.5 ${props.isChanged ? "kit-changed" : ""}`}>
      <dt className="text-lg text-ash">{props.word}</dt>
      <dd
        className={`flex items-center gap-2 font-title text-[2.75rem] leading-12 font-semibold tabular-nums ${isStop ? "text-stop" : ""}`}
      >
        {isStop ? <StateShapeIcon shape="diamond" size={22} /> : null}
        {props.count}
      </dd>
    </div>
  );
}

function Mounted(props: { floor: FloorCell; changed: ReadonlySet<string> }): ReactElement {
  const { cell } = props.floor;
  const mounts = SLOTS.flatMap((slot) => props.floor.mounts.filter((mount) => mount.slot === slot));
  const missing = missingWords(props.floor);
  return (
    <div className="mt-4 border-t border-row pt-3">
      <div className="mb-2 flex flex-wrap gap-x-8 gap-y-1 text-lg">
        {mounts.map((mount) => (
          <span
            key={mount.id}
            className={`flex items-baseline gap-2 ${props.changed.has(mountKey(mount)) ? "kit-changed pl-2" : ""}`}
          >
            <span className="text-ash">{SLOT_WORDS[mount.slot]}</span>
            <Link to={pathTo("lot", { tag: mount.lot_tag })} className="font-mono">
              {mount.lot_number}
            </Link>
          </span>
        ))}
        {missing === null ? null : <StateMark tone="attend" word={missing} />}
      </div>
      {missing === null ? null : (
        <p className="mb-2 text-ash">
          Seams welded now are linked to no lot for it. The cell's computer mounts one:{" "}
          <code className="figures">beadroll mount --slot wire --lot TAG</code>
        </p>
      )}
      <KeyValue
        rows={[
          { key: "Scanner", value: cell.scanner },
          {
            key: "Its stated accuracy",
            value: <LengthText length_mm={cell.scanner_accuracy_mm} decimals={2} />,
          },
          { key: "Robot", value: cell.robot },
          { key: "Tag", value: <TagText text={cell.tag} /> },
        ]}
      />
    </div>
  );
}
