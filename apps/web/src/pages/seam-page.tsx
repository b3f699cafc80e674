import { useSuspenseQuery } from "@tanstack/react-query";
import { type ReactElement, useState } from "react";
import { type LoaderFunctionArgs, useParams } from "react-router";
import { PATHS, pathTo } from "../app/paths.ts";
import { queryClient } from "../app/providers.tsx";
import { useMay } from "../app/session.ts";
import { InspectionForm } from "../features/seams/inspection-form.tsx";
import { InspectionsList } from "../features/seams/inspections-list.tsx";
import { PassesList } from "../features/seams/passes-list.tsx";
import { ScansTable } from "../features/seams/scans-table.tsx";
import { SeamHead } from "../features/seams/seam-head.tsx";
import { SeamLedger } from "../features/seams/seam-ledger.tsx";
import { SeamPieces } from "../features/seams/seam-pieces.tsx";
import { SeamScan } from "../features/seams/seam-scan.tsx";
import { seamQueries } from "../features/seams/seams.queries.ts";
import { CursorProvider } from "../kit/cursor/cursor-context.tsx";
import { Breadcrumbs } from "../kit/page/breadcrumbs.tsx";
import { Sheet, SheetGrid, SheetStack } from "../kit/page/sheet.tsx";
import { PagePart } from "../kit/states/fault-boundary.tsx";

/** Fetches the seam first, then what belongs to it, together. */
export async function loader({ params }: LoaderFunctionArgs): Promise<null> {
  const seam = await queryClient.ensureQueryData(seamQueries.one(params["tag"] ?? ""));
  const [latest] = seam.scans;
  await Promise.all([
    queryClient.ensureQueryData(seamQueries.model(seam.model_seam.id)),
    ...(latest === undefined ? [] : [queryClient.ensureQueryData(seamQueries.scan(latest.id))]),
  ]);
  return null;
}

/** A seam's whole record. */
export default function SeamPage(): ReactElement {
  const tag = useParams()["tag"] ?? "";
  const { data: seam } = useSuspenseQuery(seamQueries.one(tag));
  const [chosen, setChosen] = useState<string | null>(null);
  const mayInspect = useMay("inspections:write");
  const latest = seam.scans.find((scan) => scan.stage === "fitup") ?? seam.scans[0];
  const shown = chosen ?? latest?.id ?? null;
  const trail = [
    { to: PATHS.parts.path, label: "Parts" },
    { to: pathTo("part", { tag: seam.part_tag }), label: seam.part_name },
  ];
  return (
    <CursorProvider>
      <SeamHead seam={seam} above={<Breadcrumbs trail={trail} />} />
      <PagePart label="The scan" rows={12}>
        <SeamScan seam={seam} scanId={shown} />
      </PagePart>
      <SheetGrid>
        <SheetStack>
          <Sheet title="Passes">
            <PassesList page={seam} />
          </Sheet>
          {seam.scans.length === 0 ? null : (
            <Sheet title="Scans" flush>
              <ScansTable scans={seam.scans} shown={shown} onShow={setChosen} />
            </Sheet>
          )}
        </SheetStack>
        <SheetStack>
          <Sheet title="Inspections">
            <InspectionsList inspections={seam.inspections} />
          </Sheet>
          {mayInspect && seam.passes.length > 0 ? (
            <Sheet title="Inspect">
              <InspectionForm seam={seam} />
            </Sheet>
          ) : null}
          <Sheet title="Pieces">
            <SeamPieces page={seam} />
          </Sheet>
          <Sheet title="Ledger">
            <SeamLedger tag={seam.tag} seqs={seam.ledger_seqs} />
          </Sheet>
        </SheetStack>
      </SheetGrid>
    </CursorProvider>
  );
}
