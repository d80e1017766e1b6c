import type { GeoGeometryObjects } from "d3-geo";
import type { Sheet } from "../../view/ground/sheet.ts";
import { type CoastDetail, loadCoast } from "./coast.ts";

/** The fine coast is drawn once the map has rested this long. */
const REST_MS = 180;

/** Which coast to draw: the coarse one at once and while anything moves, the fine one when the sheet has rested. */
export class CoastLayer {
  readonly #changed: () => void;
  readonly #land = new Map<CoastDetail, GeoGeometryObjects>();
  readonly #asked = new Set<CoastDetail>();
  #rested: Sheet | undefined;
  #timer: ReturnType<typeof setTimeout> | undefined;
  /** Neither coast could be loaded. */
  missing = false;

  /** @param changed - Called when the map should be painted again. */
  constructor(changed: () => void) {
    this.#changed = changed;
  }

  /** Land for painting this sheet; null until there is any. */
  landFor(sheet: Sheet, moving: boolean): GeoGeometryObjects | null {
    this.#ask("110m");
    const coarse = this.#land.get("110m") ?? null;
    if (!moving && sheet === this.#rested) return this.#land.get("50m") ?? coarse;
    clearTimeout(this.#timer);
    if (!moving) {
      this.#timer = setTimeout(() => {
        this.#rested = sheet;
        this.#ask("50m");
        this.#changed();
      }, REST_MS);
    }
    return coarse;
  }

  stop(): void {
    clearTimeout(this.#timer);
  }

  #ask(detail: CoastDetail): void {
    if (this.#asked.has(detail)) return;
    this.#asked.add(detail);
    loadCoast(detail).then(
      (land) => {
        this.#land.set(detail, land);
        this.missing = false;
        this.#changed();
      },
      () => {
        this.missing = this.#land.size === 0;
        this.#changed();
      },
    );
  }
}
