import { expect, it } from "vitest";
import { nextFound } from "./found-keys.ts";

it.each([
  ["into the list from outside", "ArrowDown", -1, 3, 0],
  ["down", "ArrowDown", 0, 3, 1],
  ["up", "ArrowUp", 2, 3, 1],
  ["nowhere below the last", "ArrowDown", 2, 3, 2],
  ["nowhere above the first", "ArrowUp", 0, 3, 0],
  ["nowhere up from outside", "ArrowUp", -1, 3, null],
  ["nowhere in an empty list", "ArrowDown", -1, 0, null],
  ["nowhere by another key", "a", 0, 3, null],
])("an arrow key leads %s", (_, key, here, count, next) => expect(nextFound(key, here, count)).toBe(next));
