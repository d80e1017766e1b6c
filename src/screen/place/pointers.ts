import type { ReactiveController, ReactiveControllerHost } from "lit";

/** What pointers on the map lead to. Pixels are CSS pixels of the map. */
export interface PointerActions {
  /** Whether a station stands within reach; picks it. */
  grab(x: number, y: number, reachPx: number): boolean;
  /** The grabbed station follows the pointer. */
  drag(x: number, y: number, held: boolean): void;
  /** The grabbed station is let go; `moved` false for a mere click. */
  release(moved: boolean): void;
  putBack(): void;
  pan(dxPx: number, dyPx: number): void;
  zoom(factor: number, x: number, y: number): void;
  /** A click on empty ground. */
  clickGround(): void;
  hover(x: number, y: number): void;
}

const CLICK_PX = 3;
const MOUSE_REACH_PX = 12;
const TOUCH_REACH_PX = 24;

/** Mouse, pen and fingers on one element: drag a station, pull the ground, pinch and wheel to zoom. */
export class Pointers implements ReactiveController {
  readonly #target: () => HTMLElement | null;
  readonly #actions: PointerActions;
  readonly #down = new Map<number, { x: number; y: number }>();
  #start: { x: number; y: number } | undefined;
  #mode: "none" | "station" | "ground" | "pinch" | "spent" = "none";
  #moved = false;
  #bound: HTMLElement | undefined;

  constructor(host: ReactiveControllerHost, target: () => HTMLElement | null, actions: PointerActions) {
    this.#target = target;
    this.#actions = actions;
    host.addController(this);
  }

  hostUpdated(): void {
    const element = this.#target();
    if (!element || element === this.#bound) return;
    this.#bind(element);
  }

  hostConnected(): void {
    if (this.#bound) this.#bind(this.#bound);
  }

  hostDisconnected(): void {
    const element = this.#bound;
    if (!element) return;
    element.removeEventListener("pointerdown", this.#onDown);
    element.removeEventListener("pointermove", this.#onMove);
    element.removeEventListener("pointerup", this.#onUp);
    element.removeEventListener("pointercancel", this.#onCancel);
    element.removeEventListener("wheel", this.#onWheel);
    this.#down.clear();
    this.#mode = "none";
  }

  #bind(element: HTMLElement): void {
    this.#bound = element;
    element.addEventListener("pointerdown", this.#onDown);
    element.addEventListener("pointermove", this.#onMove);
    element.addEventListener("pointerup", this.#onUp);
    element.addEventListener("pointercancel", this.#onCancel);
    element.addEventListener("wheel", this.#onWheel, { passive: false });
  }

  /** Whether a station hangs on a pointer. */
  get holding(): boolean {
    return this.#mode === "station";
  }

  /** Lets go of the station without dropping it: what is left of this press does nothing. */
  letGo(): void {
    if (this.#mode === "station") this.#mode = "spent";
  }

  /** Shift went down or up with the pointer at rest. */
  hold(held: boolean): void {
    const at = this.#down.values().next().value;
    if (this.#mode === "station" && this.#moved && at) this.#actions.drag(at.x, at.y, held);
  }

  readonly #at = (event: PointerEvent | WheelEvent): { x: number; y: number } => {
    const box = (event.currentTarget as HTMLElement).getBoundingClientRect();
    return { x: event.clientX - box.left, y: event.clientY - box.top };
  };

  readonly #onDown = (event: PointerEvent): void => {
    if (event.button !== 0) return;
    const at = this.#at(event);
    (event.currentTarget as HTMLElement).setPointerCapture(event.pointerId);
    this.#down.set(event.pointerId, at);
    if (this.#down.size === 2) {
      // A second finger turns the gesture into a pinch; a station already on its way goes back.
      if (this.#mode === "station" && this.#moved) this.#actions.putBack();
      this.#mode = "pinch";
      return;
    }
    if (this.#down.size > 2) return;
    this.#start = at;
    this.#moved = false;
    const reach = event.pointerType === "mouse" ? MOUSE_REACH_PX : TOUCH_REACH_PX;
    this.#mode = this.#actions.grab(at.x, at.y, reach) ? "station" : "ground";
  };

  readonly #onMove = (event: PointerEvent): void => {
    const at = this.#at(event);
    const before = this.#down.get(event.pointerId);
    if (!before) {
      this.#actions.hover(at.x, at.y);
      return;
    }
    if (this.#mode === "pinch") {
      this.#pinch(event.pointerId, at);
      return;
    }
    this.#down.set(event.pointerId, at);
    if (!this.#start) return;
    if (!this.#moved && Math.hypot(at.x - this.#start.x, at.y - this.#start.y) < CLICK_PX) return;
    const first = this.#moved ? before : this.#start;
    this.#moved = true;
    if (this.#mode === "station") this.#actions.drag(at.x, at.y, event.shiftKey);
    else if (this.#mode === "ground") this.#actions.pan(at.x - first.x, at.y - first.y);
  };

  #pinch(id: number, at: { x: number; y: number }): void {
    const other = [...this.#down].find(([key]) => key !== id)?.[1];
    const before = this.#down.get(id);
    this.#down.set(id, at);
    if (!other || !before) return;
    const was = Math.hypot(before.x - other.x, before.y - other.y);
    const is = Math.hypot(at.x - other.x, at.y - other.y);
    this.#actions.pan((at.x - before.x) / 2, (at.y - before.y) / 2);
    if (was > 8 && is > 8) this.#actions.zoom(is / was, (at.x + other.x) / 2, (at.y + other.y) / 2);
  }

  readonly #onUp = (event: PointerEvent): void => {
    if (!this.#down.delete(event.pointerId)) return;
    const mode = this.#mode;
    if (mode === "pinch") {
      // The finger that stays pulls the ground on.
      this.#mode = this.#down.size > 0 ? "ground" : "none";
      this.#start = this.#down.values().next().value;
      this.#moved = true;
      return;
    }
    this.#mode = "none";
    if (mode === "station") this.#actions.release(this.#moved);
    else if (mode === "ground" && !this.#moved) this.#actions.clickGround();
  };

  readonly #onCancel = (event: PointerEvent): void => {
    if (!this.#down.delete(event.pointerId)) return;
    if (this.#mode === "station" && this.#moved) this.#actions.putBack();
    if (this.#down.size === 0) this.#mode = "none";
  };

  readonly #onWheel = (event: WheelEvent): void => {
    event.preventDefault();
    const { x, y } = this.#at(event);
    const lines = event.deltaMode === WheelEvent.DOM_DELTA_LINE ? 16 : event.deltaMode === WheelEvent.DOM_DELTA_PAGE ? 400 : 1;
    // A pinch on a touch pad arrives as a wheel with Ctrl and small steps.
    const rate = event.ctrlKey ? 0.01 : 0.0018;
    this.#actions.zoom(Math.exp(-Math.max(-400, Math.min(400, event.deltaY * lines)) * rate), x, y);
  };
}
