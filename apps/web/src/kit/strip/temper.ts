/** The temper scale's colours at their share of the limit; interpolated between, ember beyond. */
const STOPS: readonly (readonly [share: number, red: number, green: number, blue: number])[] = [
  [0, 0xd6, 0xdb, 0xde],
  [0.25, 0xe9, 0xd9, 0xa3],
  [0.5, 0xd6, 0xa4, 0x4c],
  [0.72, 0x9c, 0x5c, 0x36],
  [0.88, 0x68, 0x3e, 0x7a],
  [1, 0x2e, 0x54, 0x9c],
];
const EMBER = "#c8341f";

/** The colour of a share of the limit, as #rrggbb. */
export function temperColour(share: number): string {
  if (share > 1) return EMBER;
  const at = Math.max(0, share);
  const upper = Math.max(
    1,
    STOPS.findIndex((stop) => stop[0] >= at),
  );
  const low = STOPS[upper - 1];
  const high = STOPS[upper];
  if (low === undefined || high === undefined) return EMBER;
  const part = (at - low[0]) / (high[0] - low[0]);
  const channels = [1, 2, 3].map((channel) => {
    const from = low[channel] ?? 0;
    return Math.round(from + ((high[channel] ?? 0) - from) * part);
  });
  return `#${channels.map((channel) => channel.toString(16).padStart(2, "0")).join("")}`;
}
