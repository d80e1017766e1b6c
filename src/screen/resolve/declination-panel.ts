import { css, html, nothing, svg } from "lit";
import { type DeclinationModel, declinationModel, majorLimit } from "../../view/resolve/declination.ts";
import { props } from "../parts/props.ts";
import { SizeController } from "../parts/size.ts";
import { axes, clip, hatch } from "./axes.ts";
import { Panel } from "./panel.ts";
import { plotStyles } from "./plotstyles.ts";

/** Beam width against declination: one settled answer a point, filled in as they come. */
export class DeclinationPanel extends Panel {
  readonly #area = new SizeController(this, ".area");
  static override styles = [
    ...Panel.styles,
    plotStyles,
    css`
      .limit-line {
        stroke: var(--sw-risk);
        stroke-width: 1.25;
      }
      svg text.limit {
        fill: var(--sw-risk);
      }
      .progress {
        position: absolute;
        left: 38px;
        right: 14px;
        top: 0;
        height: 3px;
        background: var(--sw-line);
      }
      .progress i {
        display: block;
        height: 100%;
        background: var(--sw-accent);
      }
    `,
  ];

  override render() {
    const { model } = this;
    if (!model) return nothing;
    const { plan, layout, observation, picture, declinations, sweeping } = model;
    const points = declinations?.layout === layout && declinations.observation === observation.id ? declinations.points : [];
    const settled = picture?.settled ? picture.result.beam.majorArcsec : null;
    const limit = majorLimit(plan, layout, observation.id);
    const figure = declinationModel(points, observation, settled, limit, this.#area.size);
    const old = declinations !== null && declinations.plan !== plan;
    return html`<section class="pane" aria-label="Resolution against declination">
      <header>
        <h2>Resolution against declination</h2>
        <span class="aside">${sweeping === null ? (old ? "of the plan before" : (figure?.aside ?? "")) : `working, ${Math.round(100 * sweeping)}\u00a0%`}</span>
      </header>
      <div class="area">
        ${figure ? this.#figure(figure) : html`<p class="waiting">${sweeping === null && points.length > 0 ? "The source is up at none of these declinations." : "Working"}</p>`}
        ${sweeping === null ? nothing : html`<div class="progress" role="progressbar" aria-label="Declinations computed" aria-valuemin="0" aria-valuemax="100" aria-valuenow=${Math.round(100 * sweeping)}><i ${props({ width: `${100 * sweeping}%` })}></i></div>`}
      </div>
      ${figure ? this.words("Resolution against declination", figure.text) : nothing}
    </section>`;
  }

  #figure(figure: DeclinationModel) {
    const { box, target, limit } = figure;
    const bottom = box.y + box.height;
    const right = box.x + box.width;
    const targetLeft = target.x > box.x + box.width * 0.6;
    return html`<svg role="img" aria-label=${figure.text.summary}>
      <defs>${clip("plot", box)}${hatch("never")}</defs>
      ${axes(box, figure.xTicks, figure.yTicks)}
      ${figure.never.map(
        (n) => svg`<rect fill="url(#never)" x=${n.x} y=${box.y} width=${n.width} height=${box.height}></rect>
          ${n.width > 52 ? svg`<text class="halo" x=${n.x + n.width / 2} y=${box.y + box.height / 2} text-anchor="middle">not up</text>` : nothing}`,
      )}
      <g clip-path="url(#plot)">
        <path class="between" d=${figure.between}></path>
        <path class="curve second" d=${figure.minor}></path>
        <path class="curve" d=${figure.major}></path>
      </g>
      ${
        limit
          ? svg`<line class="limit-line" x1=${box.x} x2=${right} y1=${limit.y} y2=${limit.y}></line>
              <text class="limit halo" x=${box.x + 5} y=${limit.y - 6}>${limit.text}</text>`
          : nothing
      }
      <line class="target-line" x1=${target.x} x2=${target.x} y1=${box.y} y2=${bottom}></line>
      <text class="target halo" x=${target.x + (targetLeft ? -7 : 7)} y=${box.y + 24} text-anchor=${targetLeft ? "end" : "start"}>${target.text}</text>
      ${figure.labels.map((l) => svg`<text class="name halo ${l.kind === "minor" ? "second" : ""}" x=${l.x} y=${l.y} text-anchor="middle">${l.text}</text>`)}
      ${target.y === null ? nothing : svg`<circle class="target-dot" cx=${target.x} cy=${target.y} r="4.5"></circle>`}
    </svg>`;
  }
}

customElements.define("sw-declination-panel", DeclinationPanel);
