import type { ModelSeam } from "@beadroll/domain/schemas/drawing";
import { useSuspenseQuery } from "@tanstack/react-query";
import { type ReactElement, useState } from "react";
import { type LoaderFunctionArgs, useParams } from "react-router";
import { PATHS } from "../app/paths.ts";
import { queryClient } from "../app/providers.tsx";
import { useMay } from "../app/session.ts";
import { DRAWING_LOOKS } from "../features/drawings/drawing-words.ts";
import { drawingQueries } from "../features/drawings/drawings.queries.ts";
import { LimitsForm } from "../features/drawings/limits-form.tsx";
import { ModelSeamsTable } from "../features/drawings/model-seams-table.tsx";
import { Breadcrumbs } from "../kit/page/breadcrumbs.tsx";
import { PageHead } from "../kit/page/page-head.tsx";
import { Sheet, SheetGrid, SheetStack } from "../kit/page/sheet.tsx";
import { StateMark } from "../kit/states/state-mark.tsx";

/** Fetches the drawing. */
export async function loader({ params }: LoaderFunctionArgs): Promise<null> {
  await queryClient.ensureQueryData(drawingQueries.one(params["id"] ?? ""));
  return null;
}

/** A drawing with its model seams. */
export default function DrawingPage(): ReactElement {
  const { data: drawing } = useSuspenseQuery(drawingQueries.one(useParams()["id"] ?? ""));
  const mayWrite = useMay("drawings:write");
  const [edited, setEdited] = useState<ModelSeam | null>(null);
  const parts = drawing.part_count === 1 ? "1 part" : `${drawing.part_count} parts`;
  const table = (
    <Sheet title="Model seams" aside="in welding sequence" flush>
      <ModelSeamsTable
        drawingId={drawing.id}
        seams={drawing.model_seams}
        onEdit={mayWrite ? setEdited : null}
      />
    </Sheet>
  );
  return (
    <>
      <PageHead
        title={`${drawing.number} rev ${drawing.revision}`}
        above={<Breadcrumbs trail={[{ to: PATHS.drawings.path, label: "Drawings" }]} />}
        state={<StateMark {...DRAWING_LOOKS[drawing.status]} />}
        facts={`${drawing.title} · ${parts} made to it`}
      />
      {edited === null ? (
        <SheetStack>{table}</SheetStack>
      ) : (
        <SheetGrid>
          {table}
          <Sheet title={`Seam ${edited.number}`}>
            <p className="mb-3 text-sm text-ash">
              For scans from now on. Scans already judged keep the limits they were judged by.
            </p>
            <LimitsForm key={edited.id} seam={edited} onDone={() => setEdited(null)} />
          </Sheet>
        </SheetGrid>
      )}
    </>
  );
}
