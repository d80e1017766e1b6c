import type { RequirementOutcome } from "../assess/requirements.ts";
import type { Picture } from "../assess/result.ts";
import type { SweepPoint } from "../assess/sweep.ts";
import { begin, canRedo, canUndo, type History, record, redo, redoLabel, undo, undoLabel } from "../plan/history.ts";
import type { Plan } from "../plan/schema.ts";
import { type Desk, STALE } from "../tasks/protocol.ts";
import { liveOutcomes, previewRadius } from "../view/ledger/live.ts";
import { quantityWords } from "../view/quantities.ts";
import { beamHalfWidth } from "../view/resolve/beam.ts";
import { uvHalf } from "../view/resolve/uv.ts";
import { fitted, openedSession, type Session } from "./session.ts";

/** Cells a side of the uv picture. */
const UV_SIZE = 384;
/** An answer that takes longer than this is said to be worked on, ms. */
const WORKING_AFTER = 150;
/** Declinations of the sweep, degrees: every 30°, then between them, then between those, so that the curve fills in. */
const SWEEP_ROUNDS: readonly (readonly number[])[] = [
  [-90, -60, -30, 0, 30, 60, 90],
  [-75, -45, -15, 15, 45, 75],
  [-82.5, -67.5, -52.5, -37.5, -22.5, -7.5, 7.5, 22.5, 37.5, 52.5, 67.5, 82.5],
];

/** Results against declination, as far as they are known. */
export interface DeclinationSweep {
  readonly plan: Plan;
  readonly layout: string;
  readonly observation: string;
  readonly points: readonly SweepPoint[];
}

/** What the screen shows at one moment. */
export interface Shown {
  /** The plan as drawn: while something is dragged, with it where it is held. */
  readonly plan: Plan;
  readonly session: Session;
  readonly picture: Picture | null;
  /** The picture belongs to another layout, observation or plan than the one shown; its successor is on its way. */
  readonly behind: boolean;
  /** It has taken longer than a moment. */
  readonly working: boolean;
  readonly dragging: boolean;
  readonly outcomes: readonly RequirementOutcome[];
  readonly live: readonly RequirementOutcome[];
  /** Edges of the uv and beam pictures, fixed while a station moves. */
  readonly uvHalfWavelengths: number | null;
  readonly beamHalfArcsec: number | null;
  readonly declinations: DeclinationSweep | null;
  /** Fraction of the declination sweep done; null when none is under way. */
  readonly sweeping: number | null;
  readonly undoLabel: string | null;
  readonly redoLabel: string | null;
  /** The computation's own trouble, as a sentence. */
  readonly fault: string | null;
  readonly toast: Toast | null;
  /** What changed in the ledger with the last settled answer, for those who do not see it. */
  readonly announced: string;
}

export interface Toast {
  readonly id: number;
  readonly text: string;
  readonly action: "undo" | "redo" | null;
}

/**
 * The state of the page: plan and its history, session, and what the workers have answered so far.
 * Every change of plan, layout, observation or pair asks for a settled picture, then for the ledger; a drag asks for previews.
 */
export class Store {
  readonly #desk: Desk;
  readonly #listeners = new Set<() => void>();
  #history: History;
  #draft: Plan | null = null;
  #dragKey = 0;
  #asked = 0;
  #workingTimer: ReturnType<typeof setTimeout> | undefined;
  #sweepTimer: ReturnType<typeof setTimeout> | undefined;
  #settled: Picture | null = null;
  #shown: Shown;

  constructor(desk: Desk, plan: Plan, kept: Pick<Session, "task" | "theme" | "keys">) {
    this.#desk = desk;
    this.#history = begin(plan);
    this.#shown = {
      plan,
      session: openedSession(plan, kept),
      picture: null,
      behind: true,
      working: false,
      dragging: false,
      outcomes: [],
      live: [],
      uvHalfWavelengths: null,
      beamHalfArcsec: null,
      declinations: null,
      sweeping: null,
      undoLabel: null,
      redoLabel: null,
      fault: null,
      toast: null,
      announced: "",
    };
    void this.#settle();
  }

  get shown(): Shown {
    return this.#shown;
  }

  /** The plan as recorded, without what is being dragged. */
  get plan(): Plan {
    return this.#history.present;
  }

  subscribe(listener: () => void): () => void {
    this.#listeners.add(listener);
    return () => this.#listeners.delete(listener);
  }

  /** Opens another plan; the one before can be brought back by undo. */
  open(plan: Plan, title: string): void {
    this.#draft = null;
    this.#history = record(this.#history, `open ${title}`, plan);
    this.#shown = { ...this.#shown, session: openedSession(plan, this.#shown.session), outcomes: [], picture: null };
    this.#settled = null;
    this.#planChanged();
    this.say(`Opened ${title}.`, "undo");
  }

  /**
   * One step of the plan.
   *
   * @param label - What was done, as it reads after "Undo": "move T12 High Latch".
   * @param squash - Steps in a row with one key are undone together.
   */
  edit(label: string, plan: Plan, squash?: string): void {
    this.#draft = null;
    this.#history = record(this.#history, label, plan, squash);
    this.#planChanged();
  }

  /**
   * Shows a plan that is held, not yet recorded.
   *
   * @param how - "move": only stations moved since the drag began, a preview follows; "rebuild": the observation changed in
   *   a way a preview can follow; "settle": in a way only a settled answer can.
   */
  drag(plan: Plan, how: "move" | "rebuild" | "settle"): void {
    const first = this.#draft === null;
    this.#draft = plan;
    if (first || how === "rebuild") this.#dragKey += 1;
    this.#update({ plan, dragging: true });
    if (how === "settle") void this.#settle();
    else {
      if (first) this.#forgetSettling();
      this.#update({ working: false });
      void this.#preview(plan);
    }
  }

  /** Lets go without a change. */
  release(): void {
    if (!this.#draft) return;
    this.#draft = null;
    this.#planChanged();
  }

  undo(): void {
    if (!canUndo(this.#history)) return;
    const label = this.#shown.undoLabel;
    this.#draft = null;
    this.#history = undo(this.#history);
    this.#planChanged();
    this.say(`Undone: ${label}.`, "redo");
  }

  redo(): void {
    if (!canRedo(this.#history)) return;
    const label = this.#shown.redoLabel;
    this.#draft = null;
    this.#history = redo(this.#history);
    this.#planChanged();
    this.say(`Done again: ${label}.`, "undo");
  }

  /** Changes what is looked at. */
  look(change: Partial<Session>): void {
    const before = this.#shown.session;
    const session = fitted({ ...before, ...change }, this.#shown.plan);
    const layout = session.layout !== before.layout;
    const observation = session.observation !== before.observation;
    if (layout) this.#update({ session, outcomes: [], live: [] });
    else this.#update({ session });
    if (layout || observation) this.#update({ uvHalfWavelengths: null, beamHalfArcsec: null });
    if (layout || observation || session.pair !== before.pair) void this.#settle();
    else if (session.task !== before.task) this.#sweepSoon();
  }

  say(text: string, action: Toast["action"]): void {
    this.#update({ toast: { id: (this.#shown.toast?.id ?? 0) + 1, text, action } });
  }

  hush(): void {
    this.#update({ toast: null });
  }

  /** Tells of trouble that stays until the next answer. */
  complain(fault: string | null): void {
    this.#update({ fault });
  }

  #update(change: Partial<Shown>): void {
    this.#shown = { ...this.#shown, ...change };
    for (const listener of this.#listeners) listener();
  }

  #planChanged(): void {
    const plan = this.#history.present;
    this.#update({
      plan,
      dragging: false,
      session: fitted(this.#shown.session, plan),
      undoLabel: undoLabel(this.#history) ?? null,
      redoLabel: redoLabel(this.#history) ?? null,
    });
    void this.#settle();
  }

  #forgetSettling(): void {
    this.#asked += 1;
    clearTimeout(this.#workingTimer);
    clearTimeout(this.#sweepTimer);
    for (const task of ["picture", "ledger", "sweep"] as const) this.#desk.drop(task);
  }

  async #settle(): Promise<void> {
    this.#forgetSettling();
    this.#desk.drop("preview");
    const asked = this.#asked;
    const { plan, session } = this.#shown;
    const { layout, observation, pair } = session;
    this.#update({ behind: true, sweeping: null });
    this.#workingTimer = setTimeout(() => this.#update({ working: true }), WORKING_AFTER);
    try {
      const picture = await this.#desk.ask("picture", { plan, layout, observation, pair, uvSize: UV_SIZE });
      if (picture === STALE || asked !== this.#asked) return;
      this.#settled = picture;
      this.#update({
        picture,
        behind: false,
        fault: null,
        uvHalfWavelengths: picture.uv && uvHalf(picture.uv),
        beamHalfArcsec: beamHalfWidth(picture.result.beam, picture.beam),
      });
      const { pair: _, ...known } = picture.result;
      const outcomes = await this.#desk.ask("ledger", { plan, layout, known: [known] });
      if (outcomes === STALE || asked !== this.#asked) return;
      clearTimeout(this.#workingTimer);
      const announced = ledgerChange(plan, this.#shown.outcomes, outcomes);
      this.#update({ outcomes, live: [], working: false, announced });
      this.#sweepSoon();
    } catch (error) {
      if (asked !== this.#asked) return;
      clearTimeout(this.#workingTimer);
      this.#update({ working: false, behind: false, fault: error instanceof Error ? error.message : String(error) });
    }
  }

  async #preview(plan: Plan): Promise<void> {
    const settled = this.#settled?.result;
    const { layout, observation } = this.#shown.session;
    if (!settled || settled.layout !== layout || settled.observation !== observation) return;
    const base = { ...settled, beam: { ...settled.beam, sidelobeRadiusArcsec: previewRadius(plan, layout, settled) } };
    const key = `${this.#dragKey}`;
    try {
      const picture = await this.#desk.ask("preview", { plan, layout, observation, pair: null, uvSize: UV_SIZE, key, base });
      if (picture === STALE || !picture || !this.#draft) return;
      this.#update({ picture, live: liveOutcomes(plan, picture.result, settled.beam.sidelobeRadiusArcsec), fault: null });
    } catch (error) {
      if (this.#draft) this.#update({ fault: error instanceof Error ? error.message : String(error) });
    }
  }

  /** The sweep over declination waits until nothing else is asked for, and runs only where it is seen. */
  #sweepSoon(): void {
    clearTimeout(this.#sweepTimer);
    if (this.#shown.session.task !== "resolve" || this.#shown.behind || this.#shown.sweeping !== null) return;
    this.#sweepTimer = setTimeout(() => void this.#sweep(), 400);
  }

  async #sweep(): Promise<void> {
    const asked = this.#asked;
    const { plan, session } = this.#shown;
    const { layout, observation } = session;
    const known = this.#shown.declinations;
    if (known?.plan === plan && known.layout === layout && known.observation === observation) return;
    let points: readonly SweepPoint[] = [];
    const total = SWEEP_ROUNDS.flat().length;
    try {
      for (const values of SWEEP_ROUNDS) {
        const before = points.length;
        this.#update({ sweeping: before / total });
        const request = { plan, layout, observation, spec: { axis: "declination", values } } as const;
        const found = await this.#desk.ask("sweep", request, (done) =>
          this.#update({ sweeping: (before + done * values.length) / total }),
        );
        if (found === STALE || asked !== this.#asked) return;
        points = [...points, ...found].sort((a, b) => a.at - b.at);
        this.#update({ declinations: { plan, points, layout, observation } });
      }
      this.#update({ sweeping: null });
    } catch (error) {
      if (asked === this.#asked) this.#update({ sweeping: null, fault: error instanceof Error ? error.message : String(error) });
    }
  }
}

/** "Peak sidelobe not met, was met": the lines whose state changed, in the order of the plan. */
function ledgerChange(plan: Plan, before: readonly RequirementOutcome[], after: readonly RequirementOutcome[]): string {
  return after
    .flatMap((now) => {
      const was = before.find((o) => o.id === now.id);
      const line = plan.requirements.find((r) => r.id === now.id);
      if (!was || !line || was.state === now.state) return [];
      return [`${quantityWords(line.quantity).title} ${now.state}, was ${was.state}.`];
    })
    .join(" ");
}
