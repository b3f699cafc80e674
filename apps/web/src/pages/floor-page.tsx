import { useSuspenseQuery } from "@tanstack/react-query";
import { type ReactElement, useMemo } from "react";
import { PATHS } from "../app/paths.ts";
import { queryClient } from "../app/providers.tsx";
import { CellSheet } from "../features/floor/cell-sheet.tsx";
import { useChangedKeys } from "../features/floor/changed-keys.ts";
import { floorQuery } from "../features/floor/floor.queries.ts";
import { WaitingSeams } from "../features/floor/waiting-seams.tsx";
import { ButtonLink } from "../kit/actions/button.tsx";
import { PageHead } from "../kit/page/page-head.tsx";
import { SheetGrid, SheetStack } from "../kit/page/sheet.tsx";
import { EmptyState } from "../kit/states/empty-state.tsx";

/** Fetches the floor. */
export async function loader(): Promise<null> {
  await queryClient.ensureQueryData(floorQuery());
  return null;
}

const plural = (count: number, one: string, many: string) => `${count} ${count === 1 ? one : many}`;

/** Every cell now, and the seams that wait for a decision or an inspection. */
export default function FloorPage(): ReactElement {
  const { data: floor } = useSuspenseQuery(floorQuery());
  const seen = useMemo(
    () =>
      new Map(floor.cells.flatMap(({ latest }) => latest.map((seam) => [seam.id, seam.changed_at] as const))),
    [floor],
  );
  const changed = useChangedKeys(seen);
  return (
    <>
      <PageHead
        title="Floor"
        facts={`${plural(floor.held_count, "seam waits", "seams wait")} for a decision, ${plural(floor.to_inspect_count, "seam", "seams")} to inspect`}
      />
      {floor.cells.length === 0 ? (
        <FirstSteps />
      ) : (
        <SheetGrid>
          <SheetStack>
            {floor.cells.map((one) => (
              <CellSheet key={one.cell.id} floor={one} changed={changed} />
            ))}
          </SheetStack>
          <SheetStack>
            <WaitingSeams title="Held" seams={floor.held} count={floor.held_count} none="No seam is held." />
            <WaitingSeams
              title="To inspect"
              seams={floor.to_inspect}
              count={floor.to_inspect_count}
              none="No welded seam waits for an inspection."
            />
          </SheetStack>
        </SheetGrid>
      )}
    </>
  );
}

function FirstSteps(): ReactElement {
  return (
    <EmptyState
      title="No cell is recorded yet"
      action={<ButtonLink to={PATHS.drawings.path}>Begin with a drawing</ButtonLink>}
    >
      <ol className="list-decimal pl-5">
        <li>Record a drawing with its model seams, and the procedures they are welded to.</li>
        <li>Receive the lots: heats of plate, wire and gas.</li>
        <li>Start a part, print its labels.</li>
        <li>
          An administrator records the cell and gives its computer a key; there{" "}
          <code className="figures">beadroll enrol</code> takes it.
        </li>
      </ol>
    </EmptyState>
  );
}
