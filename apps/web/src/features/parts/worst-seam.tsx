import type { SeamRow } from "@beadroll/domain/schemas/seam";
import { useQuery } from "@tanstack/react-query";
import type { ReactElement } from "react";
import { Link } from "react-router";
import { pathTo } from "../../app/paths.ts";
import { Sheet } from "../../kit/page/sheet.tsx";
import { StateMark } from "../../kit/states/state-mark.tsx";
import { BeadStrip } from "../../kit/strip/bead-strip.tsx";
import { stationsFromShares } from "../../kit/strip/strip-from-shares.ts";
import { seamNumber } from "../seams/seam-words.ts";
import { seamQueries } from "../seams/seams.queries.ts";

const worstShare = (seam: SeamRow) => Math.max(0, ...(seam.strip ?? []).map((share) => Math.abs(share ?? 0)));

const URGENCY: Partial<Record<SeamRow["state"], number>> = { held: 2, rejected: 1 };

/** The seam that needs somebody most: held before rejected before the others, then by share of the limit used. */
export function worstSeam(roll: readonly SeamRow[]): SeamRow | null {
  const scanned = roll.filter((seam) => seam.strip !== null);
  return scanned.reduce<SeamRow | null>((worst, seam) => {
    if (worst === null) return seam;
    const urgency = (URGENCY[seam.state] ?? 0) - (URGENCY[worst.state] ?? 0);
    return urgency > 0 || (urgency === 0 && worstShare(seam) > worstShare(worst)) ? seam : worst;
  }, null);
}

/** The worst seam of the part, large, with the reason of its verdict. */
export function WorstSeam(props: { roll: readonly SeamRow[] }): ReactElement | null {
  const seam = worstSeam(props.roll);
  if (seam?.strip == null) return null;
  const name = `Seam ${seamNumber(seam.number, seam.attempt)}`;
  return (
    <Sheet
      title={
        <span className="flex flex-wrap items-baseline gap-x-3">
          <Link to={pathTo("seam", { tag: seam.tag })}>{name}</Link>
          {seam.verdict === null ? null : <StateMark state={seam.verdict} />}
          <Reason tag={seam.tag} />
        </span>
      }
      aside="the seam that needs somebody most"
    >
      <BeadStrip
        size="sheet"
        stations={stationsFromShares(seam.strip, seam.length_mm)}
        length_mm={seam.length_mm}
        label={`${name}, share of the limit`}
      />
    </Sheet>
  );
}

/** Why the seam is in its state. It comes a moment after the page: the list does not carry it. */
function Reason(props: { tag: string }): ReactElement | null {
  const { data } = useQuery({ ...seamQueries.one(props.tag), refetchInterval: false });
  return data === undefined ? null : <span className="text-base font-normal">{data.state_reason}</span>;
}
