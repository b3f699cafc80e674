import { ApiProblem } from "@beadroll/client/api-problem";
import { resolveTag } from "@beadroll/domain/contract/records.contract";
import { parseTag } from "@beadroll/domain/tags/parse-tag";
import type { ReactElement } from "react";
import { type LoaderFunctionArgs, redirect, useLoaderData } from "react-router";
import { api } from "../app/client.ts";
import { TagCorrection } from "../features/tags/tag-correction.tsx";
import { PageHead } from "../kit/page/page-head.tsx";
import { Sheet } from "../kit/page/sheet.tsx";

interface Refused {
  readonly typed: string;
  readonly why: string;
}

/** Resolves the tag and goes to its page; a mistyped one is refused here, before any look-up. */
export async function loader({ params, request }: LoaderFunctionArgs): Promise<Refused> {
  const typed = params["tag"] ?? "";
  const tag = parseTag(typed);
  if (!tag.ok) return { typed, why: tag.faults.map((fault) => fault.detail).join(" ") };
  try {
    const { page } = await api.call(resolveTag, { params: { tag: tag.value }, signal: request.signal });
    throw redirect(page);
  } catch (error) {
    if (!(error instanceof ApiProblem) || error.code !== "not-found") throw error;
    return {
      typed: tag.value,
      why: "The tag is well formed, but nothing here has it. It may be of another shop's system.",
    };
  }
}

/** What is shown when a tag leads nowhere: why, and a field to mend it. */
export default function TagDoorPage(): ReactElement {
  const { typed, why } = useLoaderData<Refused>();
  return (
    <div className="mx-auto max-w-xl">
      <PageHead title="This tag leads nowhere" facts={<span className="figures">{typed}</span>} />
      <Sheet>
        <TagCorrection key={typed} typed={typed} why={why} />
      </Sheet>
    </div>
  );
}
