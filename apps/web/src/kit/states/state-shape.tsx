import type { ReactElement } from "react";

/** The shapes that say a state without its colour. */
export type StateShape = "square" | "tick" | "triangle" | "diamond" | "dashed" | "open" | "ripples" | "seal";

const DRAWINGS: Record<StateShape, ReactElement> = {
  square: <rect x="2" y="2" width="8" height="8" fill="currentColor" />,
  tick: <path d="M1.5 6.5 4.6 9.6 10.6 2.4" fill="none" stroke="currentColor" strokeWidth="2.2" />,
  triangle: <path d="M6 1.2 11.2 10.4H.8z" fill="currentColor" />,
  diamond: <path d="M6 .4 11.6 6 6 11.6.4 6z" fill="currentColor" />,
  dashed: (
    <rect x="1.5" y="1.5" width="9" height="9" fill="none" stroke="currentColor" strokeDasharray="2 1.6" />
  ),
  open: <rect x="2" y="2" width="8" height="8" fill="none" stroke="currentColor" strokeWidth="1.4" />,
  ripples: (
    <path
      d="M1.5 2h.5a2.5 4 0 0 1 0 8h-.5M5 2h.5a2.5 4 0 0 1 0 8H5M8.5 2H9a2.5 4 0 0 1 0 8h-.5"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.4"
    />
  ),
  seal: (
    <path
      fillRule="evenodd"
      d="M1 1h10v10H1zM2.9 6 5.2 8.4 9.2 3.8 8.3 3 5.1 6.7 3.8 5.2z"
      fill="currentColor"
    />
  ),
};

/** A state's shape, 12 px, in the colour of the text around it. Always beside a word, so hidden from readers. */
export function StateShapeIcon(props: { shape: StateShape; size?: number }): ReactElement {
  const size = props.size ?? 12;
  return (
    <svg aria-hidden="true" viewBox="0 0 12 12" width={size} height={size} className="shrink-0">
      {DRAWINGS[props.shape]}
    </svg>
  );
}
