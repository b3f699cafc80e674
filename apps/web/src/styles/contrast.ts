/** Red, green and blue, 0 to 255. */
export type Rgb = readonly [number, number, number];

/** A colour from #rgb hex digits, six of them. */
export function rgbOf(hex: string): Rgb {
  const match = /^#([0-9a-f]{2})([0-9a-f]{2})([0-9a-f]{2})$/i.exec(hex);
  if (match === null) throw new RangeError(`hex: expected #rrggbb, got "${hex}"`);
  return [1, 2, 3].map((part) => Number.parseInt(match[part] ?? "", 16)) as unknown as Rgb;
}

/** Relative luminance, 0 to 1 (WCAG 2.2, "relative luminance"). */
export function luminance(colour: Rgb): number {
  const [red, green, blue] = colour.map((channel) => {
    const share = channel / 255;
    return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * (red ?? 0) + 0.7152 * (green ?? 0) + 0.0722 * (blue ?? 0);
}

/** Contrast ratio of two colours, 1 to 21 (WCAG 2.2, "contrast ratio"). */
export function contrast(a: string, b: string): number {
  const [dark, light] = [luminance(rgbOf(a)), luminance(rgbOf(b))].sort((x, y) => x - y);
  return ((light ?? 0) + 0.05) / ((dark ?? 0) + 0.05);
}

/** The tokens of a style sheet in one theme: name to #rrggbb, those that are plain colours. */
export function tokensOf(css: string, theme: "light" | "night"): ReadonlyMap<string, string> {
  const tokens = new Map<string, string>();
  for (const [, name, light, night] of css.matchAll(
    /--([\w-]+):\s*(?:light-dark\()?(#[0-9a-f]{6})(?:,\s*(#[0-9a-f]{6})\))?;/gi,
  )) {
    if (name !== undefined && light !== undefined)
      tokens.set(name, theme === "night" ? (night ?? light) : light);
  }
  return tokens;
}
