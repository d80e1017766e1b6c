import type { Theme } from "../view/colour.ts";

const THEME = "spanwright.theme";
const KEYS = "spanwright.keys";

/** The look a reader chose, else that of the system. Storage may be closed to the page: then nothing is kept. */
export function startingTheme(): Theme {
  const kept = read(THEME);
  if (kept === "light" || kept === "dark") return kept;
  return matchMedia("(prefers-color-scheme: dark)").matches ? "dark" : "light";
}

export const isThemeChosen = (): boolean => read(THEME) !== null;

export function keepTheme(theme: Theme): void {
  write(THEME, theme);
}

/** Single-letter keys are on unless they were turned off. */
export const startingKeys = (): boolean => read(KEYS) !== "off";

export function keepKeys(on: boolean): void {
  write(KEYS, on ? "on" : "off");
}

function read(key: string): string | null {
  try {
    return localStorage.getItem(key);
  } catch {
    return null;
  }
}

function write(key: string, value: string): void {
  try {
    localStorage.setItem(key, value);
  } catch {
    // Private windows and full disks refuse; the choice then lasts as long as the page.
  }
}
