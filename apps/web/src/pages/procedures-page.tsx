import { Procedure } from "@beadroll/domain/schemas/procedure";
import { keepPreviousData, useInfiniteQuery } from "@tanstack/react-query";
import type { ReactElement } from "react";
import type { LoaderFunctionArgs } from "react-router";
import { PATHS, pathTo } from "../app/paths.ts";
import { queryClient } from "../app/providers.tsx";
import { useMay } from "../app/session.ts";
import { STATUS_LOOKS } from "../features/procedures/procedure-words.ts";
import { type ProcedureFilter, procedureQueries } from "../features/procedures/procedures.queries.ts";
import { ButtonLink } from "../kit/actions/button.tsx";
import { PageHead } from "../kit/page/page-head.tsx";
import { Sheet } from "../kit/page/sheet.tsx";
import { EmptyState } from "../kit/states/empty-state.tsx";
import { FaultPanel } from "../kit/states/fault-panel.tsx";
import { Loading } from "../kit/states/loading.tsx";
import { problemFrom } from "../kit/states/problem-words.ts";
import { StateMark } from "../kit/states/state-mark.tsx";
import type { Column } from "../kit/tables/columns.ts";
import { DataTable } from "../kit/tables/data-table.tsx";
import { FilterChoice } from "../kit/tables/filters.tsx";
import { MoreRows } from "../kit/tables/more-rows.tsx";
import { useUrlChoice } from "../kit/tables/url-state.ts";

const STATUSES = Procedure.shape.status.options;

const COLUMNS: readonly Column<Procedure>[] = [
  { id: "number", head: "Number", value: (row) => row.number, figures: true, width: "10rem" },
  { id: "revision", head: "Rev", value: (row) => row.revision, figures: true, width: "4rem" },
  { id: "title", head: "Title", value: (row) => row.title },
  {
    id: "process",
    head: "Process",
    value: (row) => row.process,
    figures: true,
    width: "6rem",
    wideOnly: true,
  },
  {
    id: "position",
    head: "Position",
    value: (row) => row.position,
    figures: true,
    width: "6rem",
    wideOnly: true,
  },
  {
    id: "heat",
    head: "kJ/mm",
    cell: ({ ranges: { heat_input_kj_mm: heat } }) => (heat === null ? "" : `${heat.min} to ${heat.max}`),
    figures: true,
    align: "right",
    width: "8rem",
    wideOnly: true,
  },
  {
    id: "status",
    head: "Status",
    cell: (row) => <StateMark {...STATUS_LOOKS[row.status]} />,
    value: (row) => row.status,
    width: "9rem",
  },
];

function filterOf(params: URLSearchParams): ProcedureFilter {
  const status = STATUSES.find((known) => known === params.get("status"));
  return status ? { status } : {};
}

/** Fetches the procedures that the address asks for. */
export async function loader({ request }: LoaderFunctionArgs): Promise<null> {
  await queryClient.prefetchInfiniteQuery(procedureQueries.list(filterOf(new URL(request.url).searchParams)));
  return null;
}

/** Welding procedures, by number and revision. */
export default function ProceduresPage(): ReactElement {
  const [status, setStatus] = useUrlChoice("status", STATUSES);
  const query = useInfiniteQuery({
    ...procedureQueries.list(status ? { status } : {}),
    placeholderData: keepPreviousData,
  });
  const rows = query.data?.pages.flatMap((page) => page.items) ?? [];
  const mayWrite = useMay("procedures:write");
  const filter = (
    <FilterChoice
      label="Status"
      value={status}
      onChange={setStatus}
      options={STATUSES.map((value) => ({ value, label: STATUS_LOOKS[value].word }))}
    />
  );
  return (
    <>
      <PageHead
        title="Procedures"
        facts="WPS by number and revision; a revision in use is frozen"
        actions={
          mayWrite ? (
            <ButtonLink kind="primary" to={PATHS.procedureNew.path}>
              Record a procedure
            </ButtonLink>
          ) : null
        }
      />
      <Sheet flush>
        {query.isError ? (
          <FaultPanel problem={problemFrom(query.error)} onRetry={() => void query.refetch()} />
        ) : query.data === undefined ? (
          <Loading label="Procedures" rows={6} />
        ) : (
          <DataTable
            caption="Procedures"
            rows={rows}
            columns={COLUMNS}
            rowKey={(row) => row.id}
            rowHref={(row) => pathTo("procedure", { id: row.id })}
            storeKey="procedures"
            fileName="procedures"
            filters={filter}
            empty={
              <EmptyState title="No procedure here">
                A procedure is recorded as a draft and approved by the welding coordinator.
              </EmptyState>
            }
          />
        )}
        <MoreRows
          shown={rows.length}
          hasMore={query.hasNextPage}
          isLoading={query.isFetchingNextPage}
          onMore={() => void query.fetchNextPage()}
        />
      </Sheet>
    </>
  );
}
