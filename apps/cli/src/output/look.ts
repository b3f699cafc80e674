/** How text may look on the terminal it goes to. */
export interface Look {
  readonly colour: boolean;
  /** 24-bit colours. */
  readonly true_colour: boolean;
  /** Columns of the terminal; null when nobody watches and lines may be as long as they are. */
  readonly width: number | null;
}

/** The look of stdout: colour only where people read it and have not asked for none (NO_COLOR). */
export function lookOf(stream: NodeJS.WriteStream, env: NodeJS.ProcessEnv): Look {
  const isTerminal = stream.isTTY === true;
  const colour = isTerminal && !env["NO_COLOR"] && env["TERM"] !== "dumb";
  return {
    colour,
    true_colour: colour && /^(truecolor|24bit)$/.test(env["COLORTERM"] ?? ""),
    width: isTerminal ? stream.columns : null,
  };
}

const STYLES = { bold: 1, faint: 2, red: 31, green: 32, yellow: 33 } as const;
export type Style = keyof typeof STYLES;

/** Text in a style, where the terminal shows colour. */
export function styled(text: string, look: Look, ...styles: readonly Style[]): string {
  if (!look.colour || text === "") return text;
  return `\u001b[${styles.map((style) => STYLES[style]).join(";")}m${text}\u001b[0m`;
}

/** Text in a colour `#rrggbb`, where the terminal shows such colours. */
export function tinted(text: string, look: Look, hex: string): string {
  if (!look.true_colour) return text;
  const channels = [1, 3, 5].map((at) => Number.parseInt(hex.slice(at, at + 2), 16));
  return `\u001b[38;2;${channels.join(";")}m${text}\u001b[0m`;
}

/** Text from outside without what would steer the terminal. */
export function plain(text: string): string {
  return text.replaceAll(/\p{Cc}+/gu, " ");
}
