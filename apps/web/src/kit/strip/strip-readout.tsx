import type { ReactElement } from "react";
import { createPortal } from "react-dom";

/** The numbers of one station, floating above its ripple; drawn at the page's root so that no list cuts it off. */
export function StripReadout(props: {
  anchor: DOMRect;
  x: number;
  at: string;
  value: string;
  share: string;
}): ReactElement {
  const left = Math.min(Math.max(props.anchor.left + props.x, 90), innerWidth - 90);
  const below = props.anchor.top < 64;
  return createPortal(
    <div
      aria-hidden="true"
      className="screen-only pointer-events-none fixed z-40 -translate-x-1/2 rounded-sm bg-soot px-2.5 py-1.5 text-on-soot shadow-float"
      style={{
        left,
        top: below ? props.anchor.bottom + 6 : undefined,
        bottom: below ? undefined : innerHeight - props.anchor.top + 6,
      }}
    >
      <div className="figures flex gap-3 leading-4 whitespace-nowrap">
        <span className="text-ash-on-soot">{props.at}</span>
        <span className="font-medium">{props.value}</span>
      </div>
      {props.share === "" ? null : (
        <div className="text-xs whitespace-nowrap text-ash-on-soot">{props.share}</div>
      )}
    </div>,
    document.body,
  );
}
