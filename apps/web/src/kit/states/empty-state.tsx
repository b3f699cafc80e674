import type { ReactElement, ReactNode } from "react";

export interface EmptyStateProps {
  /** What belongs here. */
  title: string;
  /** How it comes to be here, in a sentence or two. */
  children: ReactNode;
  /** The first step. */
  action?: ReactNode;
}

/** An empty place that teaches: what belongs here, and the first step. */
export function EmptyState(props: EmptyStateProps): ReactElement {
  return (
    <div className="rounded-sm border border-dashed border-edge px-5 py-6">
      <p className="font-title text-lg font-semibold">{props.title}</p>
      <div className="mt-1 max-w-prose text-ash">{props.children}</div>
      {props.action === undefined ? null : <div className="mt-4">{props.action}</div>}
    </div>
  );
}
