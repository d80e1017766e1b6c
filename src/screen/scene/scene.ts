import { css, html, LitElement, nothing, type PropertyValues } from "lit";
import type { Observation, Plan } from "../../plan/schema.ts";
import type { PlaceModel } from "../../view/ground/model.ts";
import { fixed } from "../../view/numbers.ts";
import { globeSpace } from "../../view/scene/globe.ts";
import { groundSpace } from "../../view/scene/ground.ts";
import type { SpaceModel } from "../../view/scene/model.ts";
import { firstOrbit, nearer, type Orbit, orbitKey, turned } from "../../view/scene/orbit.ts";
import { sourceOf } from "../../view/scene/source.ts";
import { loadCoast } from "../place/coast.ts";
import { type Palette, paletteOf } from "../place/palette.ts";
import { base, panes } from "../shared.ts";
import type { Theme } from "../tokens.ts";
import { paintMarks } from "./marks.ts";
import { Stage } from "./stage.ts";

const DEG_PER_PX = 0.3;

/**
 * The array in space: on its ground under the sky, or on the globe. Turned by dragging, arrows or touch; nothing is moved in it.
 *
 * @fires space-lost - The browser took the picture away; the flat map can stand in.
 */
export class SpaceView extends LitElement {
  static override styles = [
    base,
    panes,
    css`
      :host {
        position: relative;
        display: block;
        overflow: hidden;
        min-width: 0;
        min-height: 0;
        background: var(--sw-desk);
      }
      canvas {
        position: absolute;
        inset: 0;
        width: 100%;
        height: 100%;
      }
      .over {
        touch-action: none;
        cursor: grab;
      }
      .over:focus-visible {
        outline-offset: -3px;
      }
      .say {
        position: absolute;
        left: 16px;
        right: 16px;
        bottom: 12px;
        display: flex;
        flex-wrap: wrap;
        align-items: end;
        gap: 8px 24px;
        pointer-events: none;
        font-size: 11px;
        line-height: 15px;
        color: var(--sw-ink-2);
      }
      .say p {
        flex: 1 1 320px;
        max-width: 86ch;
      }
      label {
        display: flex;
        align-items: center;
        gap: 10px;
        min-height: 28px;
        pointer-events: auto;
        font-size: 12px;
        color: var(--sw-ink);
        white-space: nowrap;
      }
      input {
        width: 180px;
        accent-color: var(--sw-ink);
      }
      output {
        min-width: 6ch;
        font-weight: 560;
      }
    `,
  ];
  static override properties = {
    plan: { attribute: false },
    model: { attribute: false },
    observation: { attribute: false },
    theme: { attribute: false },
    hourAngleH: { state: true },
  };
  declare plan?: Plan;
  declare model?: PlaceModel;
  declare observation?: Observation;
  declare theme?: Theme;
  declare hourAngleH: number;

  #stage: Stage | undefined;
  #space: SpaceModel | undefined;
  #palette: Palette | undefined;
  #orbit: Orbit | undefined;
  #coast: readonly (readonly (readonly number[])[])[] = [];
  #frameId = 0;
  /** The model or the colours are others than those the stage has. */
  #stale = true;
  readonly #fingers = new Map<number, { x: number; y: number }>();
  readonly #resize = new ResizeObserver(() => this.#fit());

  constructor() {
    super();
    this.hourAngleH = 0;
  }

  override connectedCallback(): void {
    super.connectedCallback();
    this.#resize.observe(this);
  }

  override disconnectedCallback(): void {
    super.disconnectedCallback();
    this.#resize.disconnect();
    cancelAnimationFrame(this.#frameId);
    this.#frameId = 0;
    this.#stage?.close();
    this.#stage = undefined;
  }

  /** Closer (> 1) or farther. */
  zoom(factor: number): void {
    if (!this.#orbit || !this.#space) return;
    this.#orbit = nearer(this.#orbit, factor, this.#space.radius);
    this.#schedule();
  }

  /** The first look again. */
  fit(): void {
    if (!this.#space || !this.model) return;
    this.#orbit = firstOrbit(this.#space.kind, this.#space.radius, this.model.frame.origin);
    this.#schedule();
  }

  override willUpdate(changed: PropertyValues): void {
    const { plan, model, observation } = this;
    if (changed.has("theme")) this.#palette = undefined;
    if (!plan || !model || !observation) return;
    const source = sourceOf(plan, model.layoutId, observation, this.hourAngleH);
    const kind = this.#space?.kind;
    this.#space = model.local ? groundSpace(model, source) : globeSpace(model, source, this.#coast);
    this.#stale = true;
    if (kind !== this.#space.kind) this.fit();
    if (!model.local && this.#coast.length === 0) void this.#load();
  }

  override updated(): void {
    this.#schedule();
  }

  override render() {
    const { observation } = this;
    const space = this.#space;
    if (!space || !observation) return nothing;
    const { fromH, toH } = observation.hourAngle;
    const now = Math.min(toH, Math.max(fromH, this.hourAngleH));
    return html`
      <canvas class="gl" aria-hidden="true"></canvas>
      <canvas
        class="over"
        tabindex="0"
        role="application"
        aria-roledescription="picture in space"
        aria-label=${space.text}
        aria-describedby="keys"
        @keydown=${this.#onKey}
        @pointerdown=${this.#onDown}
        @pointermove=${this.#onMove}
        @pointerup=${this.#onUp}
        @pointercancel=${this.#onUp}
        @wheel=${this.#onWheel}
      ></canvas>
      <p id="keys" class="unseen">Arrows turn the picture, plus and minus zoom, 0 shows the first look. Stations are moved on the map.</p>
      <div class="say">
        <p>${space.text} ${space.note}</p>
        ${
          toH > fromH
            ? html`<label
                >Hour angle
                <input
                  type="range"
                  min=${fromH}
                  max=${toH}
                  step="0.05"
                  .value=${String(now)}
                  @input=${(event: Event) => {
                    this.hourAngleH = Number((event.target as HTMLInputElement).value);
                  }}
                /><output>${now > 0 ? "+" : ""}${fixed(now, 2)}&nbsp;h</output></label
              >`
            : nothing
        }
      </div>
    `;
  }

  async #load(): Promise<void> {
    // A coast that does not load leaves the globe without one; the next change asks again.
    const land = await loadCoast("110m").catch(() => undefined);
    if (land?.type !== "GeometryCollection") return;
    this.#coast = land.geometries.flatMap((g) =>
      g.type === "MultiPolygon" ? g.coordinates.flat() : g.type === "Polygon" ? g.coordinates : [],
    );
    if (this.#coast.length > 0) this.requestUpdate();
  }

  #fit(): void {
    this.#stage?.resize(this.clientWidth, this.clientHeight);
    this.#stale = true;
    this.#schedule();
  }

  #schedule(): void {
    if (this.#frameId !== 0 || !this.isConnected) return;
    this.#frameId = requestAnimationFrame(() => {
      this.#frameId = 0;
      this.#paint();
    });
  }

  #paint(): void {
    const gl = this.renderRoot.querySelector<HTMLCanvasElement>(".gl");
    const over = this.renderRoot.querySelector<HTMLCanvasElement>(".over");
    const [width, height] = [this.clientWidth, this.clientHeight];
    if (!gl || !over || !this.#space || !this.#orbit || width === 0 || height === 0) return;
    if (!this.#stage) {
      gl.addEventListener("webglcontextlost", this.#lost);
      try {
        this.#stage = new Stage(gl);
      } catch {
        this.#lost();
        return;
      }
      this.#stage.resize(width, height);
    }
    this.#palette ??= paletteOf(this);
    if (this.#stale) this.#stage.show(this.#space, this.#palette);
    this.#stale = false;
    this.#stage.draw(this.#orbit, this.#space.aimUp);
    const ratio = Math.min(2, devicePixelRatio);
    over.width = Math.round(width * ratio);
    over.height = Math.round(height * ratio);
    const ctx = over.getContext("2d");
    ctx?.setTransform(ratio, 0, 0, ratio, 0, 0);
    // The caption keeps the lowest strip to itself.
    if (ctx) paintMarks(ctx, this.#space.marks, this.#stage.seen(this.#space.marks), this.#palette, width, height - 48);
  }

  readonly #lost = (): void => {
    this.dispatchEvent(new CustomEvent("space-lost", { bubbles: true, composed: true }));
  };

  readonly #onKey = (event: KeyboardEvent): void => {
    const asked = orbitKey(event.key);
    if (!asked || event.ctrlKey || event.metaKey || event.altKey) return;
    event.preventDefault();
    event.stopPropagation();
    if (asked.turn) this.#turn(...asked.turn);
    if (asked.zoom) this.zoom(asked.zoom);
    if (asked.reset) this.fit();
  };

  #turn(turnDeg: number, tiltDeg: number): void {
    if (!this.#orbit || !this.#space) return;
    this.#orbit = turned(this.#orbit, turnDeg, tiltDeg, this.#space.kind);
    this.#schedule();
  }

  readonly #onDown = (event: PointerEvent): void => {
    (event.target as Element).setPointerCapture(event.pointerId);
    this.#fingers.set(event.pointerId, { x: event.clientX, y: event.clientY });
  };

  /** One pointer turns, two pinch. */
  readonly #onMove = (event: PointerEvent): void => {
    const before = this.#fingers.get(event.pointerId);
    if (!before) return;
    const now = { x: event.clientX, y: event.clientY };
    const other = [...this.#fingers].find(([id]) => id !== event.pointerId)?.[1];
    if (other)
      this.zoom(Math.hypot(now.x - other.x, now.y - other.y) / Math.max(1, Math.hypot(before.x - other.x, before.y - other.y)));
    else this.#turn(-DEG_PER_PX * (now.x - before.x), DEG_PER_PX * (now.y - before.y));
    this.#fingers.set(event.pointerId, now);
  };

  readonly #onUp = (event: PointerEvent): void => {
    this.#fingers.delete(event.pointerId);
  };

  readonly #onWheel = (event: WheelEvent): void => {
    event.preventDefault();
    this.zoom(Math.exp(-event.deltaY / 600));
  };
}

customElements.define("sw-space", SpaceView);

declare global {
  interface HTMLElementTagNameMap {
    "sw-space": SpaceView;
  }
}
