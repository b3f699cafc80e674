import type { Person } from "@beadroll/domain/schemas/person";
import { useInfiniteQuery } from "@tanstack/react-query";
import type { ReactElement } from "react";
import { PATHS, pathTo } from "../app/paths.ts";
import { queryClient } from "../app/providers.tsx";
import { useMay } from "../app/session.ts";
import { peopleQueries } from "../features/people/people.queries.ts";
import { ButtonLink } from "../kit/actions/button.tsx";
import { PageHead } from "../kit/page/page-head.tsx";
import { Sheet } from "../kit/page/sheet.tsx";
import { EmptyState } from "../kit/states/empty-state.tsx";
import { FaultPanel } from "../kit/states/fault-panel.tsx";
import { Loading } from "../kit/states/loading.tsx";
import { problemFrom } from "../kit/states/problem-words.ts";
import type { Column } from "../kit/tables/columns.ts";
import { DataTable } from "../kit/tables/data-table.tsx";
import { MoreRows } from "../kit/tables/more-rows.tsx";

const COLUMNS: readonly Column<Person>[] = [
  { id: "name", head: "Name", value: (person) => person.name, width: "16rem" },
  { id: "job", head: "Job", value: (person) => person.job },
  { id: "tag", head: "Badge", value: (person) => person.tag, figures: true, width: "9rem" },
];

/** Fetches the first people. */
export async function loader(): Promise<null> {
  await queryClient.prefetchInfiniteQuery(peopleQueries.list());
  return null;
}

/** The people of the shop, by name. */
export default function PeoplePage(): ReactElement {
  const query = useInfiniteQuery(peopleQueries.list());
  const rows = query.data?.pages.flatMap((page) => page.items) ?? [];
  const mayWrite = useMay("people:write");
  return (
    <>
      <PageHead
        title="People"
        facts="By name, with badge and qualifications"
        actions={
          mayWrite ? (
            <ButtonLink kind="primary" to={PATHS.personNew.path}>
              Record a person
            </ButtonLink>
          ) : null
        }
      />
      <Sheet flush>
        {query.isError ? (
          <FaultPanel problem={problemFrom(query.error)} onRetry={() => void query.refetch()} />
        ) : query.data === undefined ? (
          <Loading label="People" rows={6} />
        ) : (
          <DataTable
            caption="People"
            rows={rows}
            columns={COLUMNS}
            rowKey={(person) => person.id}
            rowHref={(person) => pathTo("person", { tag: person.tag })}
            storeKey="people"
            fileName="people"
            empty={
              <EmptyState title="Nobody yet">
                A person is recorded once and known by the badge's tag.
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
