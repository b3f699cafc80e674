/** The temper scale's stops: share of the limit used, and red, green, blue of the colour there, 0 to 255. */
const STOPS: readonly (readonly [share: number, colour: readonly [number, number, number]])[] = [
  [0, [0xd6, 0xdb, 0xde]],
  [0.25, [0xe9, 0xd9, 0xa3]],
  [0.5, [0xd6, 0xa4, 0x4c]],
  [0.72, [0x9c, 0x5c, 0x36]],
  [0.88, [0x68, 0x3e, 0x7a]],
  [1, [0x2e, 0x54, 0x9c]],
];

/** Ember: beyond the limit. */
const BEYOND = "#c8341f";

/**
 * The temper colour of a share of the limit used: plate grey at 0, straw, bronze, purple, blue at the limit, ember red
 * beyond it, straight lines between the stops. It always means the share of a limit, never a category.
 * @param share |value| / limit, 0 or more; below 0 counts as 0, the limit itself is still inside
 * @returns `#rrggbb`, lower case
 * @throws RangeError when `share` is no number: what was not measured has no colour
 * Example: `temperColour(0.5)` is `#d6a44c`.
 */
export function temperColour(share: number): string {
  if (Number.isNaN(share))
    throw new RangeError("share: expected a number, got NaN; draw what was not measured as a gap");
  if (share > 1) return BEYOND;
  const at = Math.max(0, share);
  const upper = Math.max(
    1,
    STOPS.findIndex(([stop]) => stop >= at),
  );
  const [[lowShare, low], [highShare, high]] = [STOPS[upper - 1]!, STOPS[upper]!];
  const part = (at - lowShare) / (highShare - lowShare);
  return `#${low.map((from, channel) => hexByte(from + (high[channel]! - from) * part)).join("")}`;
}

function hexByte(value: number): string {
  return Math.round(value).toString(16).padStart(2, "0");
}
