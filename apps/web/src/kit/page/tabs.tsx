import { type KeyboardEvent, type ReactElement, type ReactNode, useId, useRef } from "react";

export interface Tab {
  readonly id: string;
  readonly label: ReactNode;
  readonly panel: ReactNode;
}

export interface TabsProps {
  /** Names the group for those who listen. */
  label: string;
  tabs: readonly Tab[];
  /** The tab that is open; keep it in the URL. */
  open: string;
  onOpen: (id: string) => void;
}

const STEPS: Record<string, (index: number, count: number) => number> = {
  ArrowRight: (index, count) => (index + 1) % count,
  ArrowLeft: (index, count) => (index + count - 1) % count,
  Home: () => 0,
  End: (_, count) => count - 1,
};

/** Sheets that share one place. Arrow keys go from tab to tab; only the open panel is drawn. */
export function Tabs(props: TabsProps): ReactElement {
  const id = useId();
  const list = useRef<HTMLDivElement>(null);
  const at = Math.max(
    0,
    props.tabs.findIndex((tab) => tab.id === props.open),
  );
  const onKeyDown = (event: KeyboardEvent) => {
    const next = STEPS[event.key]?.(at, props.tabs.length);
    const tab = next === undefined ? undefined : props.tabs[next];
    if (tab === undefined || next === undefined) return;
    event.preventDefault();
    props.onOpen(tab.id);
    list.current?.querySelectorAll("button")[next]?.focus();
  };
  const open = props.tabs[at];
  return (
    <div>
      <div
        ref={list}
        role="tablist"
        aria-label={props.label}
        onKeyDown={onKeyDown}
        className="screen-only flex gap-6 overflow-x-auto border-b border-rule"
      >
        {props.tabs.map((tab, index) => (
          <button
            key={tab.id}
            type="button"
            role="tab"
            id={`${id}-${tab.id}`}
            aria-selected={index === at}
            aria-controls={`${id}-panel`}
            tabIndex={index === at ? 0 : -1}
            onClick={() => props.onOpen(tab.id)}
            className="-mb-px border-b-[3px] border-transparent py-2 font-medium whitespace-nowrap text-ash -outline-offset-2! hover:text-ink aria-selected:border-spark aria-selected:text-ink"
          >
            {tab.label}
          </button>
        ))}
      </div>
      <div id={`${id}-panel`} role="tabpanel" aria-labelledby={`${id}-${open?.id}`} className="pt-5">
        {open?.panel}
      </div>
    </div>
  );
}
