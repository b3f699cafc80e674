/** Room round the drawing of every plot of a stack, so that all stand on one axis. CSS pixels. */
export interface PlotLayout {
  readonly left: number;
  readonly right: number;
  readonly width: number;
}

/** Below this the limits' words have no room beside the plot. */
const NARROW_PX = 520;

/** The margins for a width: ticks at the left, the limits' words at the right. */
export function plotLayout(width: number): PlotLayout {
  return width < NARROW_PX ? { left: 44, right: 14, width } : { left: 52, right: 92, width };
}
