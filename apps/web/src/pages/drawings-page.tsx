import { Drawing } from "@beadroll/domain/schemas/drawing";
import { keepPreviousData, useInfiniteQuery } from "@tanstack/react-query";
import type { ReactElement } from "react";
import type { LoaderFunctionArgs } from "react-router";
import { PATHS, pathTo } from "../app/paths.ts";
import { queryClient } from "../app/providers.tsx";
import { useMay } from "../app/session.ts";
import { DRAWING_LOOKS } from "../features/drawings/drawing-words.ts";
import { type DrawingFilter, drawingQueries } from "../features/drawings/drawings.queries.ts";
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

const STATUSES = Drawing.shape.status.options;

const COLUMNS: readonly Column<Drawing>[] = [
  { id: "number", head: "Number", value: (row) => row.number, figures: true, width: "9rem" },
  { id: "revision", head: "Rev", value: (row) => row.revision, figures: true, width: "4rem" },
  { id: "title", head: "Title", value: (row) => row.title },
  {
    id: "seams",
    head: "Model seams",
    value: (row) => row.model_seam_count,
    align: "right",
    figures: true,
    width: "8rem",
  },
  {
    id: "parts",
    head: "Parts",
    value: (row) => row.part_count,
    align: "right",
    figures: true,
    width: "6rem",
  },
  {
    id: "status",
    head: "Status",
    cell: (row) => <StateMark {...DRAWING_LOOKS[row.status]} />,
    value: (row) => row.status,
    width: "9rem",
  },
];

function filterOf(params: URLSearchParams): DrawingFilter {
  const status = STATUSES.find((known) => known === params.get("status"));
  return status ? { status } : {};
}

/** Fetches the drawings that the address asks for. */
export async function loader({ request }: LoaderFunctionArgs): Promise<null> {
  await queryClient.prefetchInfiniteQuery(drawingQueries.list(filterOf(new URL(request.url).searchParams)));
  return null;
}

/** Drawings, by number and revision. */
export default function DrawingsPage(): ReactElement {
  const [status, setStatus] = useUrlChoice("status", STATUSES);
  const query = useInfiniteQuery({
    ...drawingQueries.list(status ? { status } : {}),
    placeholderData: keepPreviousData,
  });
  const rows = query.data?.pages.flatMap((page) => page.items) ?? [];
  const mayWrite = useMay("drawings:write");
  const filter = (
    <FilterChoice
      label="Status"
      value={status}
      onChange={setStatus}
      options={STATUSES.map((value) => ({ value, label: DRAWING_LOOKS[value].word }))}
    />
  );
  return (
    <>
      <PageHead
        title="Drawings"
        facts="Each revision carries its model seams"
        actions={
          mayWrite ? (
            <ButtonLink kind="primary" to={PATHS.drawingNew.path}>
              Record a drawing
            </ButtonLink>
          ) : null
        }
      />
      <Sheet flush>
        {query.isError ? (
          <FaultPanel problem={problemFrom(query.error)} onRetry={() => void query.refetch()} />
        ) : query.data === undefined ? (
          <Loading label="Drawings" rows={4} />
        ) : (
          <DataTable
            caption="Drawings"
            rows={rows}
            columns={COLUMNS}
            rowKey={(row) => row.id}
            rowHref={(row) => pathTo("drawing", { id: row.id })}
            storeKey="drawings"
            fileName="drawings"
            filters={filter}
            empty={
              <EmptyState title="No drawing here">
                Parts are made to a drawing; its model seams become their seams.
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
