import { LOT_KINDS, LOT_STATES } from "@beadroll/domain/schemas/lot";
import { keepPreviousData, useInfiniteQuery } from "@tanstack/react-query";
import type { ReactElement } from "react";
import type { LoaderFunctionArgs } from "react-router";
import { PATHS } from "../app/paths.ts";
import { queryClient } from "../app/providers.tsx";
import { useMay } from "../app/session.ts";
import { KIND_WORDS } from "../features/lots/lot-words.ts";
import { type LotFilter, lotQueries } from "../features/lots/lots.queries.ts";
import { LotsTable } from "../features/lots/lots-table.tsx";
import { ButtonLink } from "../kit/actions/button.tsx";
import { PageHead } from "../kit/page/page-head.tsx";
import { Sheet } from "../kit/page/sheet.tsx";
import { EmptyState } from "../kit/states/empty-state.tsx";
import { FaultPanel } from "../kit/states/fault-panel.tsx";
import { Loading } from "../kit/states/loading.tsx";
import { problemFrom } from "../kit/states/problem-words.ts";
import { STATE_LOOKS } from "../kit/states/state-words.ts";
import { FilterChoice, FilterText } from "../kit/tables/filters.tsx";
import { MoreRows } from "../kit/tables/more-rows.tsx";
import { useUrlChoice, useUrlText } from "../kit/tables/url-state.ts";

function filterOf(params: URLSearchParams): LotFilter {
  const kind = LOT_KINDS.find((known) => known === params.get("kind"));
  const state = LOT_STATES.find((known) => known === params.get("state"));
  const number = params.get("number");
  return { ...(kind && { kind }), ...(state && { state }), ...(number && { number }) };
}

/** Fetches the lots that the address asks for. */
export async function loader({ request }: LoaderFunctionArgs): Promise<null> {
  await queryClient.prefetchInfiniteQuery(lotQueries.list(filterOf(new URL(request.url).searchParams)));
  return null;
}

/** Lots: plates, sections and tubes by heat, wire, gas and flux by lot. */
export default function LotsPage(): ReactElement {
  const [kind, setKind] = useUrlChoice("kind", LOT_KINDS);
  const [state, setState] = useUrlChoice("state", LOT_STATES);
  const [number, setNumber] = useUrlText("number");
  const filter = { ...(kind && { kind }), ...(state && { state }), ...(number && { number }) };
  const query = useInfiniteQuery({ ...lotQueries.list(filter), placeholderData: keepPreviousData });
  const lots = query.data?.pages.flatMap((page) => page.items) ?? [];
  const mayReceive = useMay("lots:write");
  const filters = (
    <>
      <FilterText label="Number begins with" value={number} onChange={setNumber} />
      <FilterChoice
        label="Kind"
        value={kind}
        onChange={setKind}
        options={LOT_KINDS.map((value) => ({ value, label: KIND_WORDS[value] }))}
      />
      <FilterChoice
        label="State"
        value={state}
        onChange={setState}
        options={LOT_STATES.map((value) => ({ value, label: STATE_LOOKS[value].word }))}
      />
    </>
  );
  return (
    <>
      <PageHead
        title="Lots"
        facts="Plate, section and tube by heat; wire, gas and flux by lot"
        actions={
          mayReceive ? (
            <ButtonLink kind="primary" to={PATHS.lotNew.path}>
              Receive a lot
            </ButtonLink>
          ) : null
        }
      />
      <Sheet flush>
        {query.isError ? (
          <FaultPanel problem={problemFrom(query.error)} onRetry={() => void query.refetch()} />
        ) : query.data === undefined ? (
          <Loading label="Lots" rows={8} />
        ) : (
          <LotsTable
            lots={lots}
            filters={filters}
            empty={
              <EmptyState title="No lot here">
                Lots come in with their heat or lot number and certificate. Nothing matches these filters.
              </EmptyState>
            }
          />
        )}
        <MoreRows
          shown={lots.length}
          hasMore={query.hasNextPage}
          isLoading={query.isFetchingNextPage}
          onMore={() => void query.fetchNextPage()}
        />
      </Sheet>
    </>
  );
}
