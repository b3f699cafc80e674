import type { ReactElement } from "react";
import { Link } from "react-router";
import { toast } from "../states/announcements.ts";

export interface TagTextProps {
  /** A tag, serial, heat or lot number. */
  text: string;
  /** Where the thing's page is. */
  to?: string;
  /** Offers to copy it. */
  copy?: boolean;
}

/** A printed code in the mono face, so that O and 0 differ; a link if it has a page. */
export function TagText(props: TagTextProps): ReactElement {
  const code = <span className="figures whitespace-nowrap">{props.text}</span>;
  return (
    <span className="inline-flex items-baseline gap-2">
      {props.to === undefined ? code : <Link to={props.to}>{code}</Link>}
      {props.copy === true ? <CopyButton text={props.text} /> : null}
    </span>
  );
}

function CopyButton(props: { text: string }): ReactElement {
  const copy = async () => {
    try {
      await navigator.clipboard.writeText(props.text);
      toast(`${props.text} copied`, "good");
    } catch (cause) {
      if (!(cause instanceof Error)) throw cause;
      toast(`The browser did not allow copying. Mark ${props.text} and copy it by hand.`, "attend");
    }
  };
  return (
    <button
      type="button"
      onClick={() => void copy()}
      aria-label={`Copy ${props.text}`}
      className="screen-only text-sm text-link hover:underline"
    >
      Copy
    </button>
  );
}
