"use client";

import { useState } from "react";
import { THEMES, toTheme, type Theme } from "./themes";

const NAMES: Readonly<Record<Theme, string>> = { system: "As the system", day: "Day", night: "Night" };

/** Day, night for a head torch, or as the system says; kept in a cookie so that the page never flashes. */
export function ThemeSwitch({ initial }: { readonly initial: Theme }) {
  const [theme, setTheme] = useState(initial);
  const choose = (next: Theme) => {
    setTheme(next);
    if (next === "system") delete document.documentElement.dataset.theme;
    else document.documentElement.dataset.theme = next;
    document.cookie = `theme=${next}; path=/; max-age=31536000; samesite=lax`;
  };
  return (
    <label className="flex min-h-11 items-center gap-2 text-13 text-pencil">
      <span>Light</span>
      <select
        value={theme}
        onChange={(event) => choose(toTheme(event.target.value))}
        className="min-h-9 rounded-field border border-hair bg-sheet px-2 text-13 text-ink"
      >
        {THEMES.map((one) => (
          <option key={one} value={one}>
            {NAMES[one]}
          </option>
        ))}
      </select>
    </label>
  );
}
