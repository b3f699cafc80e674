import { parseTag } from "@beadroll/domain/tags/parse-tag";
import { useQuery } from "@tanstack/react-query";
import type { ReactElement } from "react";
import { type LoaderFunctionArgs, redirect, useSearchParams } from "react-router";
import { pathTo } from "../app/paths.ts";
import { queryClient } from "../app/providers.tsx";
import { findQuery } from "../features/find/find.queries.ts";
import { FoundList } from "../features/find/found-list.tsx";
import { PageHead } from "../kit/page/page-head.tsx";
import { EmptyState } from "../kit/states/empty-state.tsx";
import { FaultPanel } from "../kit/states/fault-panel.tsx";
import { Loading } from "../kit/states/loading.tsx";
import { problemFrom } from "../kit/states/problem-words.ts";

const typedIn = (params: URLSearchParams) => params.get("q")?.trim() ?? "";

/** A whole tag goes straight to its record; anything else is searched for. */
export async function loader({ request }: LoaderFunctionArgs): Promise<null> {
  const q = typedIn(new URL(request.url).searchParams);
  const tag = parseTag(q);
  if (tag.ok) throw redirect(pathTo("tagDoor", { tag: tag.value }));
  if (q !== "") await queryClient.prefetchQuery(findQuery(q));
  return null;
}

/** The answer of the search field. */
export default function FindPage(): ReactElement {
  const [params] = useSearchParams();
  const q = typedIn(params);
  return (
    <>
      <PageHead title={q === "" ? "Find" : `Find “${q}”`} />
      {q === "" ? <WhatCanBeFound title="Type what you have in hand" /> : <Found q={q} />}
    </>
  );
}

function Found(props: { q: string }): ReactElement {
  const query = useQuery(findQuery(props.q));
  if (query.isError)
    return <FaultPanel problem={problemFrom(query.error)} onRetry={() => void query.refetch()} />;
  if (query.data === undefined) return <Loading label="Searching" rows={6} />;
  const { items } = query.data;
  if (items.length === 0) return <WhatCanBeFound title={`Nothing is called “${props.q}”`} />;
  return <FoundList items={items} />;
}

function WhatCanBeFound(props: { title: string }): ReactElement {
  return (
    <EmptyState title={props.title}>
      <p>
        The field at the top takes a tag (scanned or typed), a part's serial, a heat or lot number, a seam as
        “0418 S4”, a person's name, a drawing, a procedure or an order. The beginning is enough. Press{" "}
        <kbd className="figures">/</kbd> to go there.
      </p>
    </EmptyState>
  );
}
