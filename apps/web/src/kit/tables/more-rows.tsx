import type { ReactElement } from "react";
import { Button } from "../actions/button.tsx";

export interface MoreRowsProps {
  /** Rows shown so far. */
  shown: number;
  /** Whether the server has more. */
  hasMore: boolean;
  isLoading: boolean;
  onMore: () => void;
}

/** The end of a list that the server gives page by page. */
export function MoreRows(props: MoreRowsProps): ReactElement | null {
  if (props.shown === 0) return null;
  return (
    <p className="screen-only flex items-center gap-4 px-[1.125rem] py-3 text-sm text-ash">
      {props.shown} shown{props.hasMore ? "" : ", that is all"}
      {props.hasMore ? (
        <Button busy={props.isLoading} onClick={props.onMore}>
          Show more
        </Button>
      ) : null}
    </p>
  );
}
