import type { ReactiveController, ReactiveControllerHost } from "lit";
import type { Size } from "../../view/resolve/figure.ts";

/** Watches the size of a part of an element, found by selector in its shadow root, and asks for an update when it changes. */
export class SizeController implements ReactiveController {
  readonly #host: ReactiveControllerHost & Element;
  readonly #selector: string;
  readonly #observer: ResizeObserver;
  #watched: Element | null = null;
  size: Size = { width: 0, height: 0 };

  constructor(host: ReactiveControllerHost & Element, selector: string) {
    this.#host = host;
    this.#selector = selector;
    this.#observer = new ResizeObserver((entries) => {
      const box = entries[0]?.contentRect;
      if (!box) return;
      const width = Math.round(box.width);
      const height = Math.round(box.height);
      if (width === this.size.width && height === this.size.height) return;
      this.size = { width, height };
      this.#host.requestUpdate();
    });
    host.addController(this);
  }

  hostUpdated(): void {
    const found = this.#host.shadowRoot?.querySelector(this.#selector) ?? null;
    if (found === this.#watched) return;
    this.#observer.disconnect();
    this.#watched = found;
    if (found) this.#observer.observe(found);
  }

  hostConnected(): void {
    this.#host.requestUpdate();
  }

  hostDisconnected(): void {
    this.#observer.disconnect();
    this.#watched = null;
  }
}
