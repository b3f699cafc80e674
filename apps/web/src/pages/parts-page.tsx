import { keepPreviousData, useInfiniteQuery } from "@tanstack/react-query";
import type { ReactElement } from "react";
import type { LoaderFunctionArgs } from "react-router";
import { PATHS } from "../app/paths.ts";
import { queryClient } from "../app/providers.tsx";
import { useMay } from "../app/session.ts";
import { type PartFilter, partQueries } from "../features/parts/parts.queries.ts";
import { PartsTable } from "../features/parts/parts-table.tsx";
import { ButtonLink } from "../kit/actions/button.tsx";
import { PageHead } from "../kit/page/page-head.tsx";
import { Sheet } from "../kit/page/sheet.tsx";
import { EmptyState } from "../kit/states/empty-state.tsx";
import { FaultPanel } from "../kit/states/fault-panel.tsx";
import { Loading } from "../kit/states/loading.tsx";
import { problemFrom } from "../kit/states/problem-words.ts";
import { FilterChoice, FilterText } from "../kit/tables/filters.tsx";
import { MoreRows } from "../kit/tables/more-rows.tsx";
import { useUrlChoice, useUrlText } from "../kit/tables/url-state.ts";

const CONDITIONS = ["held", "rejected", "welded", "planned"] as const;
const CONDITION_WORDS = {
  held: "a held seam",
  rejected: "a rejected seam",
  welded: "a seam to inspect",
  planned: "a planned seam",
} as const;

function filterOf(params: URLSearchParams): PartFilter {
  const condition = CONDITIONS.find((known) => known === params.get("with"));
  const serial = params.get("serial");
  const order_no = params.get("order");
  return { ...(condition && { with: condition }), ...(serial && { serial }), ...(order_no && { order_no }) };
}

/** Fetches the parts that the address asks for. */
export async function loader({ request }: LoaderFunctionArgs): Promise<null> {
  await queryClient.prefetchInfiniteQuery(partQueries.list(filterOf(new URL(request.url).searchParams)));
  return null;
}

/** Parts: serialised pieces of work, each a roll of seams. */
export default function PartsPage(): ReactElement {
  const [condition, setCondition] = useUrlChoice("with", CONDITIONS);
  const [serial, setSerial] = useUrlText("serial");
  const [order, setOrder] = useUrlText("order");
  const filter = {
    ...(condition && { with: condition }),
    ...(serial && { serial }),
    ...(order && { order_no: order }),
  };
  const query = useInfiniteQuery({ ...partQueries.list(filter), placeholderData: keepPreviousData });
  const parts = query.data?.pages.flatMap((page) => page.items) ?? [];
  const mayStart = useMay("parts:write");
  const start = mayStart ? (
    <ButtonLink kind="primary" to={PATHS.partNew.path}>
      Start a part
    </ButtonLink>
  ) : null;
  const filters = (
    <>
      <FilterText label="Serial begins with" value={serial} onChange={setSerial} />
      <FilterText label="Order" value={order} onChange={setOrder} />
      <FilterChoice
        label="With"
        value={condition}
        onChange={setCondition}
        options={CONDITIONS.map((value) => ({ value, label: CONDITION_WORDS[value] }))}
      />
    </>
  );
  const isFiltered = Object.keys(filter).length > 0;
  return (
    <>
      <PageHead
        title="Parts"
        facts="Each part is a roll of seams, planned from its drawing"
        actions={start}
      />
      <Sheet flush>
        {query.isError ? (
          <FaultPanel problem={problemFrom(query.error)} onRetry={() => void query.refetch()} />
        ) : query.data === undefined ? (
          <Loading label="Parts" rows={10} />
        ) : (
          <PartsTable
            parts={parts}
            filters={filters}
            empty={
              isFiltered ? (
                <EmptyState title="No part matches">Widen the filters above.</EmptyState>
              ) : (
                <EmptyState title="No part is started yet" action={start}>
                  A part is started from a drawing; its seams are planned from the drawing's model seams, and
                  its labels are printed.
                </EmptyState>
              )
            }
          />
        )}
        <MoreRows
          shown={parts.length}
          hasMore={query.hasNextPage}
          isLoading={query.isFetchingNextPage}
          onMore={() => void query.fetchNextPage()}
        />
      </Sheet>
    </>
  );
}
