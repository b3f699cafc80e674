import { canonicalJson } from "@beadroll/domain/ledger/canonical-json";
import type { LedgerRecord } from "@beadroll/domain/schemas/ledger-record";
import type { ReactElement } from "react";
import { Link } from "react-router";
import { KeyValue } from "../../kit/page/key-value.tsx";
import type { Column } from "../../kit/tables/columns.ts";
import { DataTable } from "../../kit/tables/data-table.tsx";
import { InstantText } from "../../kit/units/instant-text.tsx";
import { entryFacts, type WrittenCell, writtenCells } from "./entry-writes.ts";

const COLUMNS: readonly Column<WrittenCell>[] = [
  { id: "table", head: "Table", value: (cell) => cell.table, width: "8rem" },
  { id: "column", head: "Column", value: (cell) => cell.column, figures: true, width: "10rem" },
  {
    id: "before",
    head: "Before",
    cell: (cell) => <Value text={cell.before ?? ""} />,
    value: (cell) => cell.before,
  },
  { id: "after", head: "After", cell: (cell) => <Value text={cell.after} />, value: (cell) => cell.after },
];

const LONGEST = 120;

function Value(props: { text: string }): ReactElement {
  const { text } = props;
  return (
    <span className="figures break-all">
      {text.length > LONGEST ? `${text.slice(0, LONGEST)}… (${text.length} characters)` : text}
    </span>
  );
}

/** One entry of the ledger, whole. */
export function EntryDetail(props: { entry: LedgerRecord }): ReactElement {
  const { entry } = props;
  const { leaf_hash, ...hashed } = entry;
  const tags = entry.subjects.filter((subject) => /^[PSLCW]-/.test(subject));
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-4">
      <KeyValue
        rows={[
          { key: "When", value: <InstantText at={entry.at} /> },
          { key: "Who", value: entry.actor },
          { key: "What", value: entry.action },
          ...entryFacts(entry.body).map(({ key, value }) => ({
            key,
            value: <span className="figures">{value}</span>,
          })),
        ]}
      />
      {tags.length === 0 ? null : (
        <p className="flex flex-wrap gap-x-3 gap-y-1 text-sm">
          About{" "}
          {tags.slice(0, 24).map((tag) => (
            <Link key={tag} to={`/t/${tag}`} className="figures">
              {tag}
            </Link>
          ))}
          {tags.length > 24 ? ` and ${tags.length - 24} more` : ""}
        </p>
      )}
      <p className="text-sm">
        Leaf hash <span className="figures break-all">{leaf_hash}</span>
      </p>
      <DataTable
        caption="Rows written"
        rows={writtenCells(entry.body)}
        columns={COLUMNS}
        rowKey={(cell) => `${cell.table} ${cell.column} ${cell.after}`}
        plain
        dense
        empty={<p className="text-ash">This entry wrote no rows.</p>}
      />
      <details>
        <summary>The canonical JSON that is hashed (RFC 8785)</summary>
        <pre className="figures mt-2 max-h-80 overflow-auto border border-rule p-3 text-sm break-all whitespace-pre-wrap">
          {canonicalJson(hashed)}
        </pre>
      </details>
    </div>
  );
}
