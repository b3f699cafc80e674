import type { ReactElement } from "react";

export interface LoadingProps {
  /** What is coming: read out, and shown when it takes long. */
  label: string;
  /** How many lines the place will take, so that nothing jumps when it comes. */
  rows?: number;
}

/** The place of something that is coming: unfilled ripples, never a guess at the content. */
export function Loading(props: LoadingProps): ReactElement {
  const rows = Array.from({ length: props.rows ?? 3 }, (_, row) => row);
  return (
    <div role="status" className="py-2">
      <p className="mb-3 text-sm text-ash">{props.label} is being fetched…</p>
      <div aria-hidden="true" className="grid gap-3">
        {rows.map((row) => (
          <div
            key={row}
            className="h-5 animate-pulse rounded-r-full rounded-l-sm border border-dashed border-edge/60 bg-hush"
            style={{ width: `${92 - ((row * 17) % 40)}%` }}
          />
        ))}
      </div>
    </div>
  );
}
