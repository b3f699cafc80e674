import { type Look, plain, styled } from "./look.ts";

const GAP = "  ";

/**
 * Rows as columns under their heads. The last column is cut to the terminal's width; where nobody watches, nothing is cut.
 */
export function columnsText(
  heads: readonly string[],
  rows: readonly (readonly string[])[],
  look: Look,
): string {
  const cells = rows.map((row) => row.map(plain));
  const widths = heads.map((head, i) =>
    Math.max(...[head, ...cells.map((row) => row[i] ?? "")].map(widthOf)),
  );
  const line = (row: readonly string[]): string =>
    cut(
      row.map((cell, i) => cell + " ".repeat((widths[i] ?? 0) - widthOf(cell))).join(GAP),
      look.width,
    ).trimEnd();
  return [styled(line(heads), look, "bold"), ...cells.map(line)].join("\n");
}

/** Characters as a person counts them; good enough for names in Latin letters, Greek and Cyrillic. */
const widthOf = (text: string): number => [...text].length;

function cut(text: string, width: number | null): string {
  const characters = [...text];
  return width === null || characters.length <= width ? text : `${characters.slice(0, width - 1).join("")}…`;
}
