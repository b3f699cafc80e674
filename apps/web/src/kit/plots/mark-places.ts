/** Width kept free for a mark's words before the next goes a line lower. */
const WORDS_PX = 150;
const ICON_PX = 8;

/** Where a mark stands: its x, its line from the top, and whether its words go to the left. */
export interface MarkPlace {
  readonly x: number;
  readonly line: number;
  readonly isLate: boolean;
}

/**
 * A line for each mark so that the words of neighbours do not run into each other. Words stand right of their mark,
 * or left of it where the plot ends.
 */
export function placeMarks(xs: readonly number[], width: number): MarkPlace[] {
  const taken: { line: number; from: number; until: number }[] = [];
  return xs.map((x) => {
    const isLate = x > width - WORDS_PX;
    const from = isLate ? x - WORDS_PX : x - ICON_PX;
    const until = isLate ? x + ICON_PX : x + WORDS_PX;
    let line = 0;
    while (taken.some((other) => other.line === line && other.from < until && from < other.until)) line++;
    taken.push({ line, from, until });
    return { x, line, isLate };
  });
}
