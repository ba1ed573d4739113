export const THEMES = ["system", "day", "night"] as const;
export type Theme = (typeof THEMES)[number];

export function toTheme(text: string | undefined): Theme {
  return THEMES.find((theme) => theme === text) ?? "system";
}
