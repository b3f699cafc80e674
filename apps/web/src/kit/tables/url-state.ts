import { useSearchParams } from "react-router";
import { parseSort, type Sort, sortText } from "./columns.ts";

/** A filter kept in the URL under a name, so that a list can be linked and comes back with the back button. */
export function useUrlText(name: string): [string, (value: string) => void] {
  const [params, setParams] = useSearchParams();
  const change = (value: string) =>
    setParams((before) => withParam(before, name, value), { replace: true, preventScrollReset: true });
  return [params.get(name) ?? "", change];
}

/** A filter by one of a few, kept in the URL; what the URL says besides counts as no filter. */
export function useUrlChoice<T extends string>(
  name: string,
  choices: readonly T[],
): [T | "", (value: T | "") => void] {
  const [text, change] = useUrlText(name);
  return [choices.find((choice) => choice === text) ?? "", change];
}

/** A table's sort kept in the URL as `sort=largest` or `sort=-largest`. */
export function useUrlSort(): [Sort | null, (sort: Sort | null) => void] {
  const [text, change] = useUrlText("sort");
  return [parseSort(text), (sort) => change(sortText(sort))];
}

/** Parameters with one set, or left out where it is empty. */
export function withParam(params: URLSearchParams, name: string, value: string): URLSearchParams {
  const next = new URLSearchParams(params);
  if (value === "") next.delete(name);
  else next.set(name, value);
  return next;
}
