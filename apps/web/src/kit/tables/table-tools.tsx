import type { ReactElement, ReactNode } from "react";
import { Button } from "../actions/button.tsx";
import { ColumnChoice } from "./column-choice.tsx";
import type { Column } from "./columns.ts";
import { toCsv } from "./csv.ts";
import { saveCsv } from "./save-file.ts";

interface TableToolsProps<Row> {
  filters: ReactNode;
  columns: readonly Column<Row>[];
  shown: ReadonlySet<string>;
  onShown: (shown: ReadonlySet<string>) => void;
  fileName?: string;
  /** Rows and columns as they stand, for the export. */
  rows: readonly Row[];
  visible: readonly Column<Row>[];
}

/** The line above a table: its filters at the left, count, columns and export at the right. */
export function TableTools<Row>(props: TableToolsProps<Row>): ReactElement {
  const { fileName } = props;
  return (
    <div className="screen-only mb-2 flex flex-wrap items-end justify-between gap-x-6 gap-y-2 px-[1.125rem] pt-3">
      <div className="flex flex-wrap items-end gap-3">{props.filters}</div>
      <div className="-mr-4 flex items-center">
        <span className="mr-2 text-sm text-ash" aria-live="polite">
          {props.rows.length === 1 ? "1 row" : `${props.rows.length} rows`}
        </span>
        <ColumnChoice columns={props.columns} shown={props.shown} onChange={props.onShown} />
        {fileName === undefined ? null : (
          <Button kind="quiet" onClick={() => saveCsv(`${fileName}.csv`, toCsv(props.rows, props.visible))}>
            Export CSV
          </Button>
        )}
      </div>
    </div>
  );
}
