import { useSyncExternalStore } from "react";
import { storedChoice } from "./choices/stored-choice.ts";

export const THEMES = ["system", "light", "night"] as const;
export type ThemeChoice = (typeof THEMES)[number];

/** The theme chosen on this screen. public/theme.js reads the same key before the first paint. */
export const themeChoice = storedChoice<ThemeChoice>("beadroll.theme", THEMES);

/** Chooses a theme, keeps it and puts it on the page. */
export function chooseTheme(choice: ThemeChoice): void {
  themeChoice.write(choice);
  if (choice === "system") delete document.documentElement.dataset["theme"];
  else document.documentElement.dataset["theme"] = choice;
}

/** The theme chosen, kept up to date. */
export function useThemeChoice(): ThemeChoice {
  return useSyncExternalStore(themeChoice.subscribe, themeChoice.read, () => "system");
}
