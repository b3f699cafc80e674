import type { LedgerRecord } from "@beadroll/domain/schemas/ledger-record";
import { keepPreviousData, useInfiniteQuery } from "@tanstack/react-query";
import { type ReactElement, useState } from "react";
import { useMay } from "../app/session.ts";
import { EntryDetail } from "../features/records/entry-detail.tsx";
import { ledgerQueries } from "../features/records/records.queries.ts";
import { Button } from "../kit/actions/button.tsx";
import { PageHead } from "../kit/page/page-head.tsx";
import { Sheet, SheetStack } from "../kit/page/sheet.tsx";
import { EmptyState } from "../kit/states/empty-state.tsx";
import { FaultPanel } from "../kit/states/fault-panel.tsx";
import { Loading } from "../kit/states/loading.tsx";
import { problemFrom } from "../kit/states/problem-words.ts";
import type { Column } from "../kit/tables/columns.ts";
import { DataTable } from "../kit/tables/data-table.tsx";
import { FilterText } from "../kit/tables/filters.tsx";
import { MoreRows } from "../kit/tables/more-rows.tsx";
import { useUrlText } from "../kit/tables/url-state.ts";
import { InstantText } from "../kit/units/instant-text.tsx";

const HASH_SHOWN = 12;

const columnsWith = (onOpen: (entry: LedgerRecord) => void): readonly Column<LedgerRecord>[] => [
  {
    id: "seq",
    head: "Entry",
    cell: (entry) => (
      <Button kind="quiet" onClick={() => onOpen(entry)}>
        #{entry.seq}
      </Button>
    ),
    value: (entry) => entry.seq,
    width: "7rem",
  },
  {
    id: "at",
    head: "When",
    cell: (entry) => <InstantText at={entry.at} />,
    value: (entry) => entry.at,
    width: "10rem",
  },
  { id: "action", head: "What", value: (entry) => entry.action, width: "11rem" },
  { id: "actor", head: "Who", value: (entry) => entry.actor, width: "12rem", wideOnly: true },
  {
    id: "subjects",
    head: "About",
    cell: (entry) => {
      const [first = "", ...more] = entry.subjects;
      return `${first.length > 12 ? `${first.slice(0, 8)}…` : first}${more.length > 0 ? ` and ${more.length} more` : ""}`;
    },
    value: (entry) => entry.subjects.join(" "),
    figures: true,
    wideOnly: true,
  },
  {
    id: "leaf",
    head: "Leaf hash",
    cell: (entry) => `${entry.leaf_hash.slice(0, HASH_SHOWN)}…`,
    value: (entry) => entry.leaf_hash,
    figures: true,
    width: "10rem",
    wideOnly: true,
  },
];

function Entries(): ReactElement {
  const [subject, setSubject] = useUrlText("subject");
  const [action, setAction] = useUrlText("action");
  const [opened, setOpened] = useState<LedgerRecord | null>(null);
  const filter = { ...(subject && { subject }), ...(action && { action }) };
  const query = useInfiniteQuery({ ...ledgerQueries.list(filter), placeholderData: keepPreviousData });
  const rows = query.data?.pages.flatMap((page) => page.items) ?? [];
  if (query.isError)
    return <FaultPanel problem={problemFrom(query.error)} onRetry={() => void query.refetch()} />;
  if (query.data === undefined) return <Loading label="Ledger entries" rows={10} />;
  return (
    <SheetStack>
      {opened === null ? null : (
        <Sheet title={`Entry #${opened.seq}`} aside={<Button onClick={() => setOpened(null)}>Close</Button>}>
          <EntryDetail entry={opened} />
        </Sheet>
      )}
      <Sheet flush>
        <DataTable
          caption="Ledger entries"
          rows={rows}
          columns={columnsWith(setOpened)}
          rowKey={(entry) => String(entry.seq)}
          storeKey="ledger"
          fileName="ledger-entries"
          dense
          filters={
            <>
              <FilterText label="About tag or id" value={subject} onChange={setSubject} />
              <FilterText
                label="What was done"
                value={action}
                onChange={setAction}
                placeholder="scan.record"
              />
            </>
          }
          empty={
            <EmptyState title="No entry matches">
              Every change appends one entry; nothing is ever taken out.
            </EmptyState>
          }
        />
        <MoreRows
          shown={rows.length}
          hasMore={query.hasNextPage}
          isLoading={query.isFetchingNextPage}
          onMore={() => void query.fetchNextPage()}
        />
      </Sheet>
    </SheetStack>
  );
}

/** The ledger: everything that was recorded, in order. */
export default function RecordsPage(): ReactElement {
  const may = useMay("ledger:read");
  return (
    <>
      <PageHead
        title="Records"
        facts="The ledger: one entry for every change, in order, each with its hash; it can only grow"
      />
      {may ? (
        <Entries />
      ) : (
        <EmptyState title="The ledger is for auditors, quality and coordination">
          Your role does not read it. The numbers of the entries about a part or seam stand on its page.
        </EmptyState>
      )}
    </>
  );
}
