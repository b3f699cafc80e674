import { type ReactElement, type ReactNode, useId } from "react";

export interface SheetProps {
  /** The sheet's heading (h2); it also names the region. */
  title?: ReactNode;
  /** Stands at the right of the heading: a count, buttons, a link. */
  aside?: ReactNode;
  /** No padding round the content: a table or a plot that reaches the edges. */
  flush?: boolean;
  children: ReactNode;
}

/** A panel: soot rule on top, one hairline, 2 px corners. */
export function Sheet(props: SheetProps): ReactElement {
  const id = useId();
  const named = props.title === undefined ? {} : { "aria-labelledby": id };
  return (
    <section
      {...named}
      className="min-w-0 rounded-sm border border-t-[3px] border-rule border-t-sheet-rule bg-sheet"
    >
      {props.title === undefined ? null : (
        <div className="flex flex-wrap items-baseline justify-between gap-x-4 gap-y-1 px-[1.125rem] pt-4 pb-2">
          <h2 id={id} className="text-lg">
            {props.title}
          </h2>
          {props.aside === undefined ? null : <div className="text-sm text-ash">{props.aside}</div>}
        </div>
      )}
      <div className={sheetPadding(props)}>{props.children}</div>
    </section>
  );
}

function sheetPadding(props: SheetProps): string {
  if (props.flush === true) return "pb-1";
  return props.title === undefined ? "px-[1.125rem] py-4" : "px-[1.125rem] pb-4";
}

/** Sheets beside each other: a wide one and a narrow one; under each other where it is narrow. */
export function SheetGrid(props: { children: ReactNode }): ReactElement {
  return (
    <div className="mt-6 grid grid-cols-[minmax(0,1fr)] items-start gap-6 lg:grid-cols-[minmax(0,1fr)_20rem]">
      {props.children}
    </div>
  );
}

/** Sheets under each other, at the page's usual distance. */
export function SheetStack(props: { children: ReactNode }): ReactElement {
  return <div className="mt-6 grid grid-cols-[minmax(0,1fr)] gap-6">{props.children}</div>;
}
