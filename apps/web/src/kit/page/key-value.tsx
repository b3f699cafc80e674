import type { ReactElement, ReactNode } from "react";

export interface KeyValueRow {
  readonly key: string;
  readonly value: ReactNode;
}

/** Facts as words at the left and values at the right, as on a delivery note. */
export function KeyValue(props: { rows: readonly KeyValueRow[]; columns?: 1 | 2 }): ReactElement {
  return (
    <dl className={props.columns === 2 ? "grid gap-x-10 md:grid-cols-2" : "grid"}>
      {props.rows.map((row) => (
        <div key={row.key} className="flex items-baseline justify-between gap-4 py-[0.1875rem]">
          <dt className="shrink-0 text-ash">{row.key}</dt>
          <dd className="min-w-0 text-right break-words">{row.value}</dd>
        </div>
      ))}
    </dl>
  );
}
