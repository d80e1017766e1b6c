import { css, html, LitElement, nothing, type PropertyValues } from "lit";
import { pannedCamera, zoomedCamera } from "../../view/ground/camera.ts";
import { fittedCamera } from "../../view/ground/fit.ts";
import { floatingAt } from "../../view/ground/floating.ts";
import type { GroundPoint } from "../../view/ground/frame.ts";
import { type MapCommand, mapCommand } from "../../view/ground/keys.ts";
import { type CallOut, callOut, type Lift, lifted, liftedBy, liftedTo, placeText } from "../../view/ground/lift.ts";
import { extentOf, type PlaceModel, type PlaceStation, titleOf } from "../../view/ground/model.ts";
import { nearestPoint, pointInDirection, type ScreenPoints } from "../../view/ground/pick.ts";
import { type Camera, drawnPoints, type Sheet, sheetFor } from "../../view/ground/sheet.ts";
import { props } from "../parts/props.ts";
import { base, panes } from "../shared.ts";
import type { Theme } from "../tokens.ts";
import { CoastLayer } from "./coast-layer.ts";
import { stationMove, stationPick } from "./events.ts";
import { paintFrame } from "./paint-frame.ts";
import { paintGlobe } from "./paint-globe.ts";
import { paintGround } from "./paint-ground.ts";
import { paintStations } from "./paint-stations.ts";
import { type Palette, paletteOf } from "./palette.ts";
import { Pointers } from "./pointers.ts";

const MARGIN_PX = 32;
const CALL_OUT = { width: 204, height: 118 };

/**
 * The ground with its stations. Draws its model, reports gestures, decides nothing; where the camera looks is its own.
 *
 * @fires station-move - A station under way, put down or put back.
 * @fires station-pick - A station picked, or null for none.
 */
export class GroundMap extends LitElement {
  static override styles = [
    base,
    panes,
    css`
      :host {
        position: relative;
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
        touch-action: none;
        cursor: grab;
        outline-offset: -3px;
        -webkit-user-select: none;
        user-select: none;
      }
      canvas:focus-visible {
        outline-offset: -3px;
      }
      .call-out {
        position: absolute;
        width: ${CALL_OUT.width}px;
        padding: 9px 12px 10px;
        pointer-events: none;
        line-height: 17px;
      }
      .call-out b {
        display: block;
        font-size: 13px;
        font-weight: 560;
        margin-bottom: 1px;
      }
      .call-out p {
        white-space: nowrap;
      }
      .clear {
        color: var(--sw-met);
        font-weight: 500;
      }
      .blocked {
        color: var(--sw-short);
        font-weight: 500;
        white-space: normal;
      }
      .note {
        position: absolute;
        right: 12px;
        bottom: 10px;
        font-size: 11px;
        line-height: 15px;
        color: var(--sw-ink-3);
        pointer-events: none;
      }
    `,
  ];
  static override properties = { model: { attribute: false }, theme: { attribute: false } };
  declare model?: PlaceModel;
  declare theme?: Theme;

  #camera: Camera | undefined;
  #sheet: Sheet | undefined;
  #lift: Lift | null = null;
  #points: ScreenPoints | undefined;
  #all: readonly PlaceStation[] = [];
  #palette: Palette | undefined;
  readonly #widths = new Map<string, number>();
  readonly #coast = new CoastLayer(() => {
    this.#schedule();
    this.requestUpdate();
  });
  #width = 0;
  #height = 0;
  /** Whether the user has chosen the view; until then it follows the plan and the window. */
  #chosen = false;
  #frameId = 0;
  #pending: { x: number; y: number; held: boolean } | undefined;
  #grip = { x: 0, y: 0 };
  #grabbed: PlaceStation | undefined;
  #said = "";
  readonly #resize = new ResizeObserver(() => this.#resized());
  readonly #pointers = new Pointers(this, () => this.renderRoot.querySelector("canvas"), {
    grab: (x, y, reachPx) => this.#grab(x, y, reachPx),
    drag: (x, y, held) => {
      this.#pending = { x: x + this.#grip.x, y: y + this.#grip.y, held };
      this.#schedule();
    },
    release: (moved) => {
      if (moved) this.#drop();
    },
    putBack: () => this.#putBack(),
    pan: (dx, dy) => {
      if (this.#sheet) this.#look(pannedCamera(this.#sheet, dx, dy));
    },
    zoom: (factor, x, y) => {
      if (this.#sheet) this.#look(zoomedCamera(this.#sheet, factor, x, y));
    },
    clickGround: () => {
      if (!this.#lift && this.model?.selected) this.dispatchEvent(stationPick(null));
    },
    hover: (x, y) => this.#hover(x, y),
  });

  override connectedCallback(): void {
    super.connectedCallback();
    this.#resize.observe(this);
    document.fonts?.ready.then(() => {
      this.#widths.clear();
      this.#schedule();
    });
  }

  override disconnectedCallback(): void {
    super.disconnectedCallback();
    this.#resize.disconnect();
    cancelAnimationFrame(this.#frameId);
    this.#frameId = 0;
    this.#coast.stop();
  }

  /** Shows the whole layout. */
  fit(): void {
    this.#chosen = false;
    this.#fitNow();
  }

  /** Closer (> 1) or farther about the middle. */
  zoom(factor: number): void {
    if (this.#sheet) this.#look(zoomedCamera(this.#sheet, factor, this.#width / 2, this.#height / 2));
  }

  override focus(options?: FocusOptions): void {
    this.renderRoot.querySelector("canvas")?.focus(options);
  }

  override willUpdate(changed: PropertyValues): void {
    const { model } = this;
    if (!changed.has("model") || !model) return;
    const before = changed.get("model") as PlaceModel | undefined;
    this.#all = [...model.stations, ...model.candidates];
    if (this.#lift && !this.#all.some(({ id }) => id === this.#lift?.station.id)) this.#lift = null;
    const moved = before && !samePlace(before, model);
    if (!before || moved) this.fit();
    else if (before.layoutId !== model.layoutId && !this.#chosen) this.#fitNow();
    else if (model.selected && model.selected.id !== before.selected?.id) this.#reveal(model.selected);
  }

  override updated(changed: PropertyValues): void {
    if (changed.has("theme")) this.#palette = undefined;
    if (changed.has("theme") || changed.has("model")) this.#schedule();
  }

  override render() {
    const { model } = this;
    const selected = model?.selected;
    const label = model
      ? `Map of ${model.layoutLabel}, ${model.stations.length} ${model.stations.length === 1 ? "station" : "stations"}. ${
          selected ? `${titleOf(selected)} picked.` : "No station picked."
        }`
      : "Map";
    return html`
      <canvas
        tabindex="0"
        role="application"
        aria-roledescription="map"
        aria-label=${label}
        aria-describedby="keys"
        @keydown=${this.#onKey}
        @keyup=${this.#onKeyUp}
        @blur=${this.#onBlur}
      ></canvas>
      <p id="keys" class="unseen">
        Arrows pick the nearest station in that direction. Enter lifts it, then arrows move it 10 metres, with Shift 100, with Alt 1; Enter puts it down,
        Escape puts it back. Plus and minus zoom, 0 shows the whole layout.
      </p>
      <p class="unseen" role="status">${this.#said}</p>
      ${this.#lift && model ? this.#callOut(callOut(this.#lift, model)) : nothing}
      ${this.#coast.missing ? html`<p class="note">The coastline did not load.</p>` : nothing}
    `;
  }

  #callOut(say: CallOut) {
    const at = { x: 0, y: 0 };
    const from = { x: 0, y: 0 };
    if (!this.#lift || !this.#sheet) return nothing;
    this.#sheet.draw(this.#lift.to, at);
    this.#sheet.draw(this.#lift.station, from);
    if (!Number.isFinite(at.x)) return nothing;
    const bounds = { x: 8, y: 22, width: this.#width - 16, height: this.#height - 30 };
    const { x, y } = floatingAt(at, Number.isFinite(from.x) ? from : at, CALL_OUT, bounds);
    return html`<div class="call-out float" ${props({ left: `${Math.round(x)}px`, top: `${Math.round(y)}px` })}>
      <b>${say.title}</b>
      <p>${say.moved}${say.held ? html`<span class="dim">, held</span>` : nothing}</p>
      <p>${say.place}</p>
      <p>${say.height}${say.verdict?.clear ? html`, <span class="clear">clear</span>` : nothing}</p>
      ${say.verdict && !say.verdict.clear ? html`<p class="blocked">${capital(say.verdict.text)}</p>` : nothing}
      <p class="dim">Esc puts it back</p>
    </div>`;
  }

  // ---- camera ----

  #resized(): void {
    const first = this.#width === 0;
    this.#width = this.clientWidth;
    this.#height = this.clientHeight;
    if (first || !this.#chosen) this.#fitNow();
    this.#sheet = undefined;
    this.#schedule();
  }

  #fitNow(): void {
    if (!this.model || this.#width === 0) return;
    this.#camera = fittedCamera(extentOf(this.model), this.model.frame, this.#width, this.#height, MARGIN_PX);
    this.#sheet = undefined;
    this.#schedule();
  }

  #look(camera: Camera): void {
    this.#chosen = true;
    this.#camera = camera;
    this.#sheet = undefined;
    this.#currentSheet();
    this.#schedule();
  }

  #currentSheet(): Sheet | undefined {
    if (this.#sheet || !this.model || !this.#camera || this.#width === 0) return this.#sheet;
    this.#sheet = sheetFor(this.#camera, this.model.frame, this.#width, this.#height, this.model.wide);
    this.#points = undefined;
    return this.#sheet;
  }

  /** Brings a place into the view, without a change of scale. */
  #reveal(place: GroundPoint): void {
    const sheet = this.#currentSheet();
    if (!sheet) return;
    const at = { x: 0, y: 0 };
    sheet.draw(place, at);
    const inside = at.x > 16 && at.x < this.#width - 16 && at.y > 24 && at.y < this.#height - 16;
    if (!inside)
      this.#look({ latitudeDeg: place.latitudeDeg, longitudeDeg: place.longitudeDeg, metresPerPx: sheet.camera.metresPerPx });
  }

  // ---- stations ----

  #screenPoints(): ScreenPoints | undefined {
    const sheet = this.#currentSheet();
    if (!sheet) return undefined;
    const { station, to } = this.#lift ?? {};
    const places: readonly GroundPoint[] = station && to ? this.#all.map((one) => (one.id === station.id ? to : one)) : this.#all;
    this.#points = drawnPoints(sheet, places, this.#points);
    return this.#points;
  }

  #grab(x: number, y: number, reachPx: number): boolean {
    const points = this.#screenPoints();
    if (this.#lift) this.#drop();
    const i = points ? nearestPoint(points, x, y, reachPx) : -1;
    if (!points || i < 0) return false;
    const station = this.#all[i];
    this.#grabbed = station;
    this.#grip = { x: points.x[i] - x, y: points.y[i] - y };
    this.#pick(station);
    return true;
  }

  #pick(station: PlaceStation): void {
    this.dispatchEvent(stationPick(station.id));
    if (this.model) this.#say(`${titleOf(station)}, ${placeText(station, this.model)}`);
  }

  #hover(x: number, y: number): void {
    const points = this.#screenPoints();
    const canvas = this.renderRoot.querySelector("canvas");
    if (!points || !canvas) return;
    const i = nearestPoint(points, x, y, 12);
    canvas.style.cursor = i < 0 ? "" : this.#all[i].locked ? "not-allowed" : "move";
  }

  #take(station: PlaceStation): boolean {
    if (station.locked) {
      this.#say(`${titleOf(station)} is locked in the plan and stays where it is`);
      return false;
    }
    this.#lift = lifted(station);
    return true;
  }

  #report(phase: "drag" | "drop" | "cancel"): void {
    const lift = this.#lift;
    if (!lift) return;
    const { latitudeDeg, longitudeDeg } = phase === "cancel" ? lift.station : lift.to;
    // A drag keeps the lift; the other two end it before anyone is told, so that what comes back is drawn as it is.
    if (phase !== "drag") this.#lift = null;
    this.dispatchEvent(stationMove({ id: lift.station.id, latitudeDeg, longitudeDeg, heightM: lift.station.heightM, phase }));
  }

  #drop(): void {
    this.#followPointer();
    if (!this.#lift || !this.model) return;
    const { title, moved, verdict } = callOut(this.#lift, this.model);
    this.#report("drop");
    this.#say(`Put down ${title}. ${moved}${verdict ? `, ${verdict.text}` : ""}`);
    this.#schedule();
  }

  #putBack(): void {
    this.#pending = undefined;
    this.#pointers.letGo();
    if (!this.#lift) return;
    const title = titleOf(this.#lift.station);
    this.#report("cancel");
    this.#say(`Put back ${title}`);
    this.#schedule();
  }

  /** The grabbed station goes where the pointer last was. */
  #followPointer(): void {
    const to = this.#pending;
    const sheet = this.#currentSheet();
    this.#pending = undefined;
    if (!to || !sheet || !this.model || !this.#grabbed) return;
    if (!this.#lift && !this.#take(this.#grabbed)) {
      this.#pointers.letGo();
      return;
    }
    const lift = this.#lift as Lift | null;
    const place = lift && sheet.place(to.x, to.y, lift.station.heightM);
    if (!lift || !place) return;
    this.#lift = liftedTo(lift, place, this.model.frame, to.held);
    this.#report("drag");
    this.requestUpdate();
  }

  // ---- keys ----

  readonly #onKey = (event: KeyboardEvent): void => {
    if (event.key === "Shift") this.#pointers.hold(true);
    const command = mapCommand(event, this.#lift !== null);
    if (!command || !this.#obey(command)) return;
    event.preventDefault();
    event.stopPropagation();
  };

  readonly #onKeyUp = (event: KeyboardEvent): void => {
    if (event.key === "Shift") this.#pointers.hold(false);
  };

  /** A station lifted by keys is put down when the focus leaves; it can be undone there. */
  readonly #onBlur = (): void => {
    if (this.#lift && !this.#pointers.holding) this.#drop();
  };

  #obey(command: MapCommand): boolean {
    switch (command.do) {
      case "pick":
        this.#pickTowards(command.direction);
        return true;
      case "step":
        this.#step(command.eastM, command.northM);
        return true;
      case "zoom":
        this.zoom(command.factor);
        return true;
      case "fit":
        this.fit();
        return true;
      case "lift":
        return this.#liftSelected();
      case "drop":
        if (!this.#pointers.holding) this.#drop();
        return true;
      case "putBack":
        this.#putBack();
        return true;
      case "clear":
        if (!this.model?.selected) return false;
        this.dispatchEvent(stationPick(null));
        return true;
    }
  }

  #pickTowards(direction: Parameters<typeof pointInDirection>[3]): void {
    const points = this.#screenPoints();
    if (!points) return;
    const from = this.#all.findIndex(({ id }) => id === this.model?.selected?.id);
    const middle = { x: this.#width / 2, y: this.#height / 2 };
    const i =
      from < 0 || !Number.isFinite(points.x[from])
        ? nearestPoint(points, middle.x, middle.y, Number.POSITIVE_INFINITY)
        : pointInDirection(points, points.x[from], points.y[from], direction, from);
    if (i >= 0) this.#pick(this.#all[i]);
  }

  #liftSelected(): boolean {
    const selected = this.model?.selected;
    if (!selected) return false;
    if (this.#take(selected)) {
      this.#say(`Lifted ${titleOf(selected)}. Arrows move it 10 metres, Enter puts it down, Escape puts it back`);
      this.#schedule();
    }
    return true;
  }

  #step(eastM: number, northM: number): void {
    if (!this.#lift || !this.model || this.#pointers.holding) return;
    this.#lift = liftedBy(this.#lift, eastM, northM, this.model.frame);
    this.#report("drag");
    const { moved, verdict } = callOut(this.#lift, this.model);
    this.#say(`${moved}${verdict ? `, ${verdict.text}` : ""}`);
    this.#reveal(this.#lift.to);
    this.#schedule();
  }

  #say(text: string): void {
    this.#said = text;
    this.requestUpdate();
  }

  // ---- painting ----

  #schedule(): void {
    if (this.#frameId !== 0 || !this.isConnected) return;
    this.#frameId = requestAnimationFrame(() => {
      this.#frameId = 0;
      this.#followPointer();
      this.#paint();
    });
  }

  #paint(): void {
    const canvas = this.renderRoot.querySelector("canvas");
    const ctx = canvas?.getContext("2d");
    const sheet = this.#currentSheet();
    const points = this.#screenPoints();
    if (!canvas || !ctx || !sheet || !points || !this.model) return;
    const ratio = window.devicePixelRatio || 1;
    const [w, h] = [Math.round(this.#width * ratio), Math.round(this.#height * ratio)];
    if (canvas.width !== w || canvas.height !== h) {
      canvas.width = w;
      canvas.height = h;
    }
    ctx.setTransform(ratio, 0, 0, ratio, 0, 0);
    this.#palette ??= paletteOf(this);
    const coast = sheet.kind === "local" ? null : this.#coast.landFor(sheet, this.#lift !== null);
    const scene = { model: this.model, sheet, points, lift: this.#lift, coast, palette: this.#palette };
    if (sheet.kind === "local") paintGround(ctx, scene);
    else paintGlobe(ctx, scene);
    paintStations(ctx, scene, this.#widths);
    paintFrame(ctx, scene);
  }
}

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

/** Whether two models lie on the same ground: another one starts with a view of its own. */
function samePlace(a: PlaceModel, b: PlaceModel): boolean {
  return a.frame.origin.latitudeDeg === b.frame.origin.latitudeDeg && a.frame.origin.longitudeDeg === b.frame.origin.longitudeDeg;
}

customElements.define("sw-ground-map", GroundMap);

declare global {
  interface HTMLElementTagNameMap {
    "sw-ground-map": GroundMap;
  }
}
