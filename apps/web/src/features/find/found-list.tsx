import type { Found } from "@beadroll/domain/schemas/find";
import { type ReactElement, useRef } from "react";
import { Link } from "react-router";
import { Sheet } from "../../kit/page/sheet.tsx";
import { foundGroups, foundPath, isCut } from "./found-groups.ts";
import { useFoundKeys } from "./found-keys.ts";
import { matchParts } from "./match-parts.ts";

/** What was found, by kind. Arrow keys go from one to the next, Enter opens. */
export function FoundList(props: { items: readonly Found[]; searched: string }): ReactElement {
  const holder = useRef<HTMLDivElement>(null);
  useFoundKeys(holder);
  return (
    <div ref={holder} className="grid grid-cols-[minmax(0,1fr)] gap-6">
      {foundGroups(props.items).map((group) => (
        <Sheet
          key={group.kind}
          title={group.heading}
          aside={isCut(group) ? `first ${group.items.length}; type more to narrow` : group.items.length}
          flush
        >
          <ul>
            {group.items.map((item) => (
              <li key={item.id} className="border-t border-row">
                <FoundLink item={item} searched={props.searched} />
              </li>
            ))}
          </ul>
        </Sheet>
      ))}
    </div>
  );
}

function FoundLink(props: { item: Found; searched: string }): ReactElement {
  const { item, searched } = props;
  return (
    <Link
      data-found
      to={foundPath(item)}
      className="grid min-h-12 grid-cols-[minmax(0,1fr)_auto] items-baseline gap-x-4 px-[1.125rem] py-2.5 text-ink no-underline -outline-offset-2! hover:bg-hush focus-visible:bg-hush md:grid-cols-[16rem_minmax(0,1fr)_auto]"
    >
      <span className="font-semibold text-link">
        <Matched text={item.title} searched={searched} />
      </span>
      <span className="text-ash max-md:order-last max-md:col-span-2">
        <Matched text={item.detail} searched={searched} />
      </span>
      <span className="figures text-ash">{item.tag}</span>
    </Link>
  );
}

/** A text with what was searched for underlined, so that one sees why it was found. */
function Matched(props: { text: string; searched: string }): ReactElement {
  const [before, match, after] = matchParts(props.text, props.searched);
  return (
    <>
      {before}
      {match === "" ? null : (
        <mark className="bg-transparent text-inherit underline decoration-spark decoration-2 underline-offset-3">
          {match}
        </mark>
      )}
      {after}
    </>
  );
}
