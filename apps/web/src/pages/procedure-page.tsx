import { useSuspenseQuery } from "@tanstack/react-query";
import type { ReactElement } from "react";
import { type LoaderFunctionArgs, useParams } from "react-router";
import { PATHS } from "../app/paths.ts";
import { queryClient } from "../app/providers.tsx";
import { useMay } from "../app/session.ts";
import { ProcedureDeeds } from "../features/procedures/procedure-deeds.tsx";
import { STATUS_LOOKS } from "../features/procedures/procedure-words.ts";
import { procedureQueries } from "../features/procedures/procedures.queries.ts";
import { RangesTable } from "../features/procedures/ranges-table.tsx";
import { Breadcrumbs } from "../kit/page/breadcrumbs.tsx";
import { KeyValue } from "../kit/page/key-value.tsx";
import { PageHead } from "../kit/page/page-head.tsx";
import { Sheet, SheetGrid } from "../kit/page/sheet.tsx";
import { StateMark } from "../kit/states/state-mark.tsx";
import { InstantText } from "../kit/units/instant-text.tsx";

/** Fetches the procedure. */
export async function loader({ params }: LoaderFunctionArgs): Promise<null> {
  await queryClient.ensureQueryData(procedureQueries.one(params["id"] ?? ""));
  return null;
}

/** A welding procedure and its ranges. */
export default function ProcedurePage(): ReactElement {
  const { data: procedure } = useSuspenseQuery(procedureQueries.one(useParams()["id"] ?? ""));
  const mayWrite = useMay("procedures:write");
  return (
    <>
      <PageHead
        title={`${procedure.number} rev ${procedure.revision}`}
        above={<Breadcrumbs trail={[{ to: PATHS.procedures.path, label: "Procedures" }]} />}
        state={<StateMark {...STATUS_LOOKS[procedure.status]} />}
        facts={procedure.title}
        actions={mayWrite ? <ProcedureDeeds procedure={procedure} /> : null}
      />
      <SheetGrid>
        <Sheet
          title="Ranges"
          aside={procedure.used ? "frozen: seams were welded to them" : "not welded to yet"}
          flush
        >
          <RangesTable ranges={procedure.ranges} />
        </Sheet>
        <Sheet title="The procedure">
          <KeyValue
            rows={[
              { key: "Process, ISO 4063", value: <span className="figures">{procedure.process}</span> },
              { key: "Position, ISO 6947", value: <span className="figures">{procedure.position}</span> },
              { key: "Recorded", value: <InstantText at={procedure.created_at} /> },
              { key: "Version", value: <span className="figures">{procedure.version}</span> },
            ]}
          />
        </Sheet>
      </SheetGrid>
    </>
  );
}
