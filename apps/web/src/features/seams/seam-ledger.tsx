import { useQuery } from "@tanstack/react-query";
import type { ReactElement } from "react";
import { Link } from "react-router";
import { PATHS } from "../../app/paths.ts";
import { useMay } from "../../app/session.ts";
import { FaultPanel } from "../../kit/states/fault-panel.tsx";
import { Loading } from "../../kit/states/loading.tsx";
import { problemFrom } from "../../kit/states/problem-words.ts";
import { InstantText } from "../../kit/units/instant-text.tsx";
import { seamQueries } from "./seams.queries.ts";

const SHOWN_HASH = 16;

/** The ledger's entries about a part or seam, for those who may read the ledger; else their numbers. */
export function SeamLedger(props: { tag: string; seqs: readonly number[] }): ReactElement {
  const may = useMay("ledger:read");
  const entries = useQuery({ ...seamQueries.ledger(props.tag), enabled: may });
  if (!may) return <p className="figures">{props.seqs.map((seq) => `#${seq}`).join(" ")}</p>;
  if (entries.isError)
    return <FaultPanel problem={problemFrom(entries.error)} onRetry={() => void entries.refetch()} />;
  if (entries.data === undefined) return <Loading label="Ledger entries" rows={3} />;
  return (
    <ol className="grid gap-2">
      {entries.data.items.map((entry) => (
        <li key={entry.seq} className="grid gap-0.5 text-sm">
          <span className="flex flex-wrap items-baseline justify-between gap-x-3">
            <span>
              <span className="figures">#{entry.seq}</span> {entry.action}
            </span>
            <span className="text-ash">
              <InstantText at={entry.at} />
            </span>
          </span>
          <span className="text-ash">
            {entry.actor}, leaf <span className="figures">{entry.leaf_hash.slice(0, SHOWN_HASH)}…</span>
          </span>
        </li>
      ))}
      <li className="text-sm">
        <Link to={`${PATHS.records.path}?${new URLSearchParams({ subject: props.tag }).toString()}`}>
          All entries about it
        </Link>
      </li>
    </ol>
  );
}
