import type { Found } from "@beadroll/domain/schemas/find";
import { type KeyboardEvent, type ReactElement, useRef } from "react";
import { Link } from "react-router";
import { Sheet, SheetStack } from "../../kit/page/sheet.tsx";
import { foundGroups, foundPath } from "./found-groups.ts";

const STEPS: Readonly<Record<string, number>> = { ArrowDown: 1, ArrowUp: -1 };

/** What was found, by kind. Arrow keys go from one to the next, Enter opens. */
export function FoundList(props: { items: readonly Found[] }): ReactElement {
  const holder = useRef<HTMLDivElement>(null);
  const move = (event: KeyboardEvent) => {
    const step = STEPS[event.key];
    if (step === undefined) return;
    const links = [...(holder.current?.querySelectorAll<HTMLAnchorElement>("a[data-found]") ?? [])];
    const here = links.findIndex((link) => link.matches(":focus"));
    const next = links[Math.max(0, Math.min(links.length - 1, here + step))];
    if (next === undefined) return;
    event.preventDefault();
    next.focus();
  };
  return (
    // biome-ignore lint/a11y/noStaticElementInteractions: the keys only move between the links inside
    <div ref={holder} onKeyDown={move}>
      <SheetStack>
        {foundGroups(props.items).map(({ kind, heading, items }) => (
          <Sheet key={kind} title={heading} aside={String(items.length)} flush>
            <ul>
              {items.map((item) => (
                <li key={item.id} className="border-t border-row">
                  <FoundLink item={item} />
                </li>
              ))}
            </ul>
          </Sheet>
        ))}
      </SheetStack>
    </div>
  );
}

function FoundLink(props: { item: Found }): ReactElement {
  const { item } = props;
  return (
    <Link
      data-found
      to={foundPath(item)}
      className="flex flex-wrap items-baseline gap-x-4 px-[1.125rem] py-2.5 text-ink no-underline hover:bg-hush"
    >
      <span className="font-semibold text-link">{item.title}</span>
      <span className="min-w-0 flex-1 text-ash">{item.detail}</span>
      {item.tag === null ? null : <span className="figures text-ash">{item.tag}</span>}
    </Link>
  );
}
