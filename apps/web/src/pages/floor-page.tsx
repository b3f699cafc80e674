import type { Floor } from "@beadroll/domain/schemas/floor";
import { useInfiniteQuery, useSuspenseQuery } from "@tanstack/react-query";
import { type ReactElement, useMemo, useState } from "react";
import { useSearchParams } from "react-router";
import { PATHS } from "../app/paths.ts";
import { queryClient } from "../app/providers.tsx";
import { useMay } from "../app/session.ts";
import { CellForm } from "../features/cells/cell-form.tsx";
import { FirstSteps } from "../features/cells/first-steps.tsx";
import { drawingQueries } from "../features/drawings/drawings.queries.ts";
import { CellSheet } from "../features/floor/cell-sheet.tsx";
import { useChangedKeys } from "../features/floor/changed-keys.ts";
import { floorQuery, LIVE_MS } from "../features/floor/floor.queries.ts";
import { floorValues, HELD_COUNT, TO_INSPECT_COUNT } from "../features/floor/floor-values.ts";
import { useNow } from "../features/floor/since-text.tsx";
import { WaitingSeams } from "../features/floor/waiting-seams.tsx";
import { partQueries } from "../features/parts/parts.queries.ts";
import { Button, ButtonLink } from "../kit/actions/button.tsx";
import { PageHead } from "../kit/page/page-head.tsx";
import { Sheet } from "../kit/page/sheet.tsx";
import { StateMark } from "../kit/states/state-mark.tsx";
import { formatInstantExactly } from "../kit/units/instants.ts";

/** Fetches the floor. */
export async function loader(): Promise<null> {
  await queryClient.ensureQueryData(floorQuery());
  return null;
}

/** Every cell now, and the seams that wait. `?cell=TAG` shows one cell alone, for a screen that stands by it. */
export default function FloorPage(): ReactElement {
  const { data: floor, dataUpdatedAt } = useSuspenseQuery(floorQuery());
  const [params] = useSearchParams();
  const now_ms = useNow(LIVE_MS);
  const changed = useChangedKeys(useMemo(() => floorValues(floor), [floor]));
  const [isRecording, setRecording] = useState(false);
  const mayRecord = useMay("cells:write");
  const one = floor.cells.find(({ cell }) => cell.tag === params.get("cell"));
  const isFresh = floor.cells.length === 0;
  return (
    <>
      <PageHead
        title="Floor"
        facts={<LiveLine asked_ms={dataUpdatedAt} now_ms={now_ms} />}
        actions={
          one === undefined ? (
            mayRecord && !isFresh && !isRecording ? (
              <Button onClick={() => setRecording(true)}>Record a cell</Button>
            ) : undefined
          ) : (
            <ButtonLink to={PATHS.floor.path}>All cells</ButtonLink>
          )
        }
      />
      {isRecording ? (
        <div className="mb-6 max-w-2xl">
          <Sheet title="Record a cell">
            <CellForm onDone={() => setRecording(false)} />
          </Sheet>
        </div>
      ) : null}
      {isFresh ? (
        !isRecording && <FreshShop onRecordCell={mayRecord ? () => setRecording(true) : null} />
      ) : (
        <div className="grid grid-cols-[minmax(0,1fr)] items-start gap-6 lg:grid-cols-[minmax(0,1fr)_20rem]">
          <div
            className={`grid grid-cols-[minmax(0,1fr)] items-start gap-6 ${one === undefined && floor.cells.length > 1 ? "xl:grid-cols-2" : ""}`}
          >
            {(one === undefined ? floor.cells : [one]).map((each) => (
              <CellSheet key={each.cell.id} floor={each} changed={changed} now_ms={now_ms} />
            ))}
          </div>
          <Waiting floor={floor} changed={changed} now_ms={now_ms} />
        </div>
      )}
    </>
  );
}

/** How fresh the screen is. A screen that is no longer told anything must not look as if nothing happened. */
function LiveLine(props: { asked_ms: number; now_ms: number }): ReactElement {
  const isLate = props.now_ms - props.asked_ms > 4 * LIVE_MS;
  const at = new Date(props.asked_ms).toISOString();
  return (
    <span role="status">
      {isLate ? (
        <StateMark
          tone="attend"
          word={`The server has not answered since ${formatInstantExactly(at)}: this may be old`}
        />
      ) : (
        "Shows by itself what is recorded · counts from midnight UTC"
      )}
    </span>
  );
}

function Waiting(props: { floor: Floor; changed: ReadonlySet<string>; now_ms: number }): ReactElement {
  const { floor, ...live } = props;
  const partsWith = (condition: string) => `${PATHS.parts.path}?with=${condition}`;
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] items-start gap-6 max-lg:sm:grid-cols-2">
      <WaitingSeams
        title="Held"
        state="held"
        todo="The welding coordinator decides each, the longest waiting first."
        none="No seam is held."
        seams={floor.held}
        count={floor.held_count}
        countKey={HELD_COUNT}
        all={{ to: partsWith("held"), words: "parts with held seams" }}
        {...live}
      />
      <WaitingSeams
        title="To inspect"
        state="welded"
        todo="Welded and not inspected, the longest waiting first."
        none="No welded seam waits for an inspection."
        seams={floor.to_inspect}
        count={floor.to_inspect_count}
        countKey={TO_INSPECT_COUNT}
        all={{ to: partsWith("welded"), words: "parts with welded seams" }}
        {...live}
      />
    </div>
  );
}

/** A shop without a cell; which of the first steps are done is asked only here. */
function FreshShop(props: { onRecordCell: (() => void) | null }): ReactElement {
  const drawings = useInfiniteQuery(drawingQueries.list({}));
  const parts = useInfiniteQuery(partQueries.list({}));
  return (
    <FirstSteps
      hasDrawing={(drawings.data?.pages[0]?.items.length ?? 0) > 0}
      hasPart={(parts.data?.pages[0]?.items.length ?? 0) > 0}
      onRecordCell={props.onRecordCell}
      mayMakeKeys={useMay("keys:manage")}
    />
  );
}
