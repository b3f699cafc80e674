import { type ReactElement, type ReactNode, useEffect } from "react";

export interface PageHeadProps {
  /** The page's h1 and the browser's title: what this is. */
  title: string;
  /** One line under it: drawing, tag, counts. */
  facts?: ReactNode;
  /** In what state it is, as a StateMark. */
  state?: ReactNode;
  /** What can be done now. */
  actions?: ReactNode;
  /** Breadcrumbs above the title. */
  above?: ReactNode;
}

/** The top of a page: what is it, in what state, what can be done now. */
export function PageHead(props: PageHeadProps): ReactElement {
  // The browser's title lives outside React.
  useEffect(() => {
    document.title = `${props.title} · Beadroll`;
  }, [props.title]);
  return (
    <div className="mb-5">
      {props.above}
      <div className="flex flex-wrap items-end justify-between gap-x-6 gap-y-3">
        <div className="min-w-0">
          <div className="flex flex-wrap items-baseline gap-x-5 gap-y-1">
            <h1 tabIndex={-1} className="text-page tracking-[-0.005em] break-words">
              {props.title}
            </h1>
            {props.state === undefined ? null : <div className="text-lg">{props.state}</div>}
          </div>
          {props.facts === undefined ? null : <div className="mt-1 text-ash">{props.facts}</div>}
        </div>
        {props.actions === undefined ? null : (
          <div className="screen-only flex flex-wrap gap-3">{props.actions}</div>
        )}
      </div>
    </div>
  );
}
