/** Where a bar of the ledger ends, in pixels from the plumb line: right in hand, left short. */
export interface BarEnd {
  readonly x: number;
  /** Beyond the end of the scale: the bar stops there and carries a chevron. */
  readonly off: boolean;
}

/** Pixels each side of the plumb line has for its end of the scale. */
export interface Room {
  readonly left: number;
  readonly right: number;
}

/** The scale ends here: a fifth short, two fifths in hand. */
export const MOST_SHORT = 0.2;
export const MOST_IN_HAND = 0.4;

/** Margins marked with a dotted guide. */
export const GUIDES = [0.05, 0.2] as const;

/**
 * Square root of the margin, each side to its own room: what is nearly met or nearly missed stays readable beside what is not.
 *
 * @param margin - Fraction of the limit, negative when short; any finite value.
 */
export function barEnd(margin: number, room: Room): BarEnd {
  const size = Math.abs(margin);
  const [most, px] = margin < 0 ? [MOST_SHORT, -room.left] : [MOST_IN_HAND, room.right];
  return { x: px * Math.sqrt(Math.min(size, most) / most) + 0, off: size > most };
}
