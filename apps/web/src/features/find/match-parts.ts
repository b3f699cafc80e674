/** A text cut at what was searched for: before, the match itself, after. */
export type MatchParts = readonly [before: string, match: string, after: string];

/** Where a text holds what was searched for, whatever the case; the match is empty where it does not. */
export function matchParts(text: string, searched: string): MatchParts {
  const at = searched === "" ? -1 : text.toLowerCase().indexOf(searched.toLowerCase());
  if (at < 0) return [text, "", ""];
  const end = at + searched.length;
  return [text.slice(0, at), text.slice(at, end), text.slice(end)];
}
