/** Roles a canvas needs, read from the tokens of the element it belongs to: a canvas knows no custom properties. */
export interface Palette {
  readonly desk: string;
  readonly surface: string;
  readonly sunken: string;
  readonly ink: string;
  readonly ink2: string;
  readonly ink3: string;
  readonly line: string;
  readonly edge: string;
  readonly accent: string;
  readonly accentWash: string;
  readonly halo: string;
  readonly font: string;
}

export function paletteOf(element: Element): Palette {
  const style = getComputedStyle(element);
  const role = (name: string): string => style.getPropertyValue(`--sw-${name}`).trim();
  return {
    desk: role("desk"),
    surface: role("surface"),
    sunken: role("sunken"),
    ink: role("ink"),
    ink2: role("ink-2"),
    ink3: role("ink-3"),
    line: role("line"),
    edge: role("edge"),
    accent: role("accent"),
    accentWash: role("accent-wash"),
    halo: role("halo"),
    font: role("font") || "sans-serif",
  };
}
