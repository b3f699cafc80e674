import { useSyncExternalStore } from "react";
import { storedChoice } from "./stored-choice.ts";

export type ShortcutChoice = "on" | "off";

/** Whether single keys such as "/" do something: WCAG 2.1.4 asks that they can be switched off. */
export const shortcutChoice = storedChoice<ShortcutChoice>("beadroll.shortcuts", ["on", "off"]);

/** The choice, kept up to date. */
export function useShortcutChoice(): ShortcutChoice {
  return useSyncExternalStore(shortcutChoice.subscribe, shortcutChoice.read, () => "on");
}
