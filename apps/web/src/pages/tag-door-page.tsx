import { ApiProblem } from "@beadroll/client/api-problem";
import { resolveTag } from "@beadroll/domain/contract/records.contract";
import type { ReactElement } from "react";
import { type LoaderFunctionArgs, useLoaderData } from "react-router";
import { api } from "../app/client.ts";
import { leadOn } from "../app/lead-on.ts";
import { foundPath } from "../features/find/found-groups.ts";
import { type RefusedTag, TagCorrection } from "../features/tags/tag-correction.tsx";
import { readTag, unknownTag } from "../features/tags/tag-reading.ts";

/** Resolves the tag and leads on to its page. A mistyped tag is refused here, before any look-up. */
export async function loader({ params, request }: LoaderFunctionArgs): Promise<RefusedTag> {
  const typed = params["tag"] ?? "";
  const read = readTag(typed);
  if (!read.ok) return { typed, fault: read.fault };
  try {
    const found = await api.call(resolveTag, { params: { tag: read.tag }, signal: request.signal });
    throw leadOn(request, foundPath(found));
  } catch (error) {
    if (!(error instanceof ApiProblem) || error.code !== "not-found") throw error;
    return { typed: read.tag, fault: unknownTag(read.tag) };
  }
}

/** What is shown when a tag leads nowhere. */
export default function TagDoorPage(): ReactElement {
  const refused = useLoaderData<RefusedTag>();
  return <TagCorrection key={refused.typed} {...refused} />;
}
