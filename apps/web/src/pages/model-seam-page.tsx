import { useSuspenseQuery } from "@tanstack/react-query";
import type { ReactElement } from "react";
import { type LoaderFunctionArgs, useParams } from "react-router";
import { PATHS, pathTo } from "../app/paths.ts";
import { queryClient } from "../app/providers.tsx";
import { NotFound } from "../app/route-fault.tsx";
import { drawingQueries } from "../features/drawings/drawings.queries.ts";
import { MeasureHere } from "../features/model-seams/measure-here.tsx";
import { ScanPlanSheet } from "../features/model-seams/scan-plan-sheet.tsx";
import { jointWords } from "../features/seams/seam-words.ts";
import { seamQueries } from "../features/seams/seams.queries.ts";
import { CursorProvider } from "../kit/cursor/cursor-context.tsx";
import { Breadcrumbs } from "../kit/page/breadcrumbs.tsx";
import { PageHead } from "../kit/page/page-head.tsx";
import { SheetStack } from "../kit/page/sheet.tsx";
import { PagePart } from "../kit/states/fault-boundary.tsx";
import { LengthText } from "../kit/units/length-text.tsx";

/** Fetches the drawing, then the seam's model. */
export async function loader({ params }: LoaderFunctionArgs): Promise<null> {
  const drawing = await queryClient.ensureQueryData(drawingQueries.one(params["id"] ?? ""));
  const seam = drawing.model_seams.find(({ number }) => number === params["number"]);
  if (seam) await queryClient.ensureQueryData(seamQueries.model(seam.id));
  return null;
}

/** A seam as designed: how it is to be scanned, and a place to measure a scan of it. */
export default function ModelSeamPage(): ReactElement {
  const params = useParams();
  const { data: drawing } = useSuspenseQuery(drawingQueries.one(params["id"] ?? ""));
  const seam = drawing.model_seams.find(({ number }) => number === params["number"]);
  if (seam === undefined) return <NotFound />;
  const name = `${drawing.number} rev ${drawing.revision}`;
  const trail = [
    { to: PATHS.drawings.path, label: "Drawings" },
    { to: pathTo("drawing", { id: drawing.id }), label: name },
  ];
  return (
    <CursorProvider>
      <PageHead
        title={`Model seam ${seam.number}`}
        above={<Breadcrumbs trail={trail} />}
        facts={
          <>
            {jointWords(seam.joint_type, seam.weld_size_mm)},{" "}
            <LengthText length_mm={seam.length_mm} decimals={0} /> · level {seam.quality_level} ·{" "}
            {seam.procedure_name ?? "no procedure"}
          </>
        }
      />
      <PagePart label="The model" rows={8}>
        <Tools seamId={seam.id} number={seam.number} />
      </PagePart>
    </CursorProvider>
  );
}

function Tools(props: { seamId: string; number: string }): ReactElement {
  const { data: model } = useSuspenseQuery(seamQueries.model(props.seamId));
  return (
    <SheetStack>
      <ScanPlanSheet model={model} />
      <MeasureHere model={model} number={props.number} />
    </SheetStack>
  );
}
