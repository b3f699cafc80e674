import { parseTag } from "@beadroll/domain/tags/parse-tag";
import { useQuery } from "@tanstack/react-query";
import type { ReactElement } from "react";
import { type LoaderFunctionArgs, useSearchParams } from "react-router";
import { leadOn } from "../app/lead-on.ts";
import { PATHS, pathTo } from "../app/paths.ts";
import { queryClient } from "../app/providers.tsx";
import { findQuery } from "../features/find/find.queries.ts";
import { foundPath, soleTagged } from "../features/find/found-groups.ts";
import { FoundList } from "../features/find/found-list.tsx";
import { tagPlaces } from "../features/tags/tag-reading.ts";
import { ButtonLink, ButtonRow } from "../kit/actions/button.tsx";
import { PageHead } from "../kit/page/page-head.tsx";
import { EmptyState } from "../kit/states/empty-state.tsx";
import { FaultPanel } from "../kit/states/fault-panel.tsx";
import { Loading } from "../kit/states/loading.tsx";
import { problemFrom } from "../kit/states/problem-words.ts";

const typedIn = (params: URLSearchParams) => params.get("q")?.trim() ?? "";

/** Searches. A whole tag that was found goes straight to its record. */
export async function loader({ request }: LoaderFunctionArgs): Promise<null> {
  const q = typedIn(new URL(request.url).searchParams);
  if (q === "") return null;
  // A search that fails is told by the page, which can ask again.
  await queryClient.prefetchQuery(findQuery(q));
  const tag = parseTag(q);
  const items = queryClient.getQueryData(findQuery(q).queryKey)?.items ?? [];
  const only = tag.ok ? soleTagged(items, tag.value) : null;
  if (only !== null) throw leadOn(request, foundPath(only));
  return null;
}

/** The answer of the search field. */
export default function FindPage(): ReactElement {
  const [params] = useSearchParams();
  const q = typedIn(params);
  return q === "" ? <NothingTyped /> : <Found q={q} />;
}

function Found(props: { q: string }): ReactElement {
  const { q } = props;
  const query = useQuery(findQuery(q));
  const count = query.data?.items.length;
  return (
    <>
      <PageHead title={`Find “${q}”`} facts={count === undefined ? undefined : countWords(count)} />
      {query.isError ? (
        <FaultPanel problem={problemFrom(query.error)} onRetry={() => void query.refetch()} />
      ) : query.data === undefined ? (
        <Loading label="What was found" rows={6} />
      ) : count === 0 ? (
        <NothingFound q={q} />
      ) : (
        <FoundList items={query.data.items} searched={q} />
      )}
    </>
  );
}

function countWords(count: number): ReactElement {
  if (count === 0) return <>Nothing found</>;
  return (
    <>
      {count === 1 ? "One thing" : `${count} things`}
      <span className="max-md:hidden">
        {" · "}
        <kbd className="figures">↓</kbd> goes into the list, <kbd className="figures">Enter</kbd> opens
      </span>
    </>
  );
}

function NothingTyped(): ReactElement {
  return (
    <>
      <PageHead title="Find" />
      <EmptyState title="Type what you have in hand">
        <WhatCanBeFound />
      </EmptyState>
    </>
  );
}

/** No record is called so. What looks like a tag is more likely a slip of the finger: the door says where. */
function NothingFound(props: { q: string }): ReactElement {
  const read = parseTag(props.q);
  const tag = read.ok ? read.value : tagPlaces(props.q)?.symbols;
  return (
    <EmptyState
      title={`Nothing here is called “${props.q}”`}
      action={
        tag !== undefined ? (
          <ButtonLink to={pathTo("tagDoor", { tag })}>Read it as a tag</ButtonLink>
        ) : (
          <ButtonRow>
            <ButtonLink to={PATHS.parts.path}>All parts</ButtonLink>
            <ButtonLink to={PATHS.lots.path}>All lots</ButtonLink>
            <ButtonLink to={PATHS.drawings.path}>All drawings</ButtonLink>
          </ButtonRow>
        )
      }
    >
      <WhatCanBeFound />
    </EmptyState>
  );
}

const WAYS = [
  ["A tag", "S-8K3F7Q2NS", "scanned or typed; case and hyphens do not matter"],
  ["A part's serial", "0418", "or its name with it: Skid frame 0418"],
  ["An order", "41-2207", "every part of it"],
  ["A heat, wire or gas lot", "H48812", "the number as it stands on the plate, spool or bottle"],
  ["A drawing or procedure", "FW-2210", "number, revision or title"],
  ["A person or cell", "Varga", "any part of the name"],
] as const;

function WhatCanBeFound(): ReactElement {
  return (
    <>
      <p>
        The field at the top (<kbd className="figures">/</kbd> goes there) takes any of these; for numbers the
        beginning is enough.
      </p>
      <dl className="mt-3 grid gap-x-6 gap-y-1 sm:grid-cols-[auto_auto_minmax(0,1fr)]">
        {WAYS.map(([what, example, how]) => (
          <div key={what} className="max-sm:mt-2 sm:contents">
            <dt className="font-medium text-ink">{what}</dt>
            <dd className="figures leading-[1.375rem] text-ink">{example}</dd>
            <dd>{how}</dd>
          </div>
        ))}
      </dl>
    </>
  );
}
