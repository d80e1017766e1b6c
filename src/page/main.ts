import { readPlan } from "../plan/read.ts";
import type { App } from "../screen/shell/app.ts";
import "../screen/shell/app.ts";
import workedPlan from "../../scenarios/thistledown.plan.json?url";
import { isTask, type TaskName } from "../screen/session.ts";
import { Store } from "../screen/store.ts";
import { tokens } from "../screen/tokens.ts";
import type { WorkerLike } from "../tasks/protocol.ts";
import { desk } from "./desk.ts";
import { chosenFile, opened, saved } from "./files.ts";
import "./page.css";
import { isThemeChosen, keepKeys, keepTheme, startingKeys, startingTheme } from "./theme.ts";

document.adoptedStyleSheets = [tokens.styleSheet as CSSStyleSheet];
const root = document.documentElement;
root.dataset.theme = startingTheme();

const taskOfHash = (): TaskName => {
  const text = location.hash.slice(1);
  return isTask(text) ? text : "place";
};

const app = document.querySelector("sw-app") as App;
void start();

async function start(): Promise<void> {
  const response = await fetch(workedPlan);
  if (!response.ok) throw new Error(`The worked plan could not be fetched: ${response.status}.`);
  const { plan } = readPlan(await response.text());
  const worker = (): WorkerLike => new Worker(new URL("./worker.ts", import.meta.url), { type: "module" }) as unknown as WorkerLike;
  const store = new Store(desk(worker, navigator.hardwareConcurrency ?? 2), plan, {
    task: taskOfHash(),
    theme: startingTheme(),
    keys: startingKeys(),
  });
  followSession(store);
  followFiles(store);
  app.store = store;
}

/** Hash, look and keys go with the session, and the session with them. */
function followSession(store: Store): void {
  window.addEventListener("hashchange", () => store.look({ task: taskOfHash() }));
  let bySystem = false;
  const followSystem = (): void => {
    if (isThemeChosen()) return;
    bySystem = true;
    store.look({ theme: startingTheme() });
    bySystem = false;
  };
  matchMedia("(prefers-color-scheme: dark)").addEventListener("change", followSystem);
  let before = store.shown.session;
  store.subscribe(() => {
    const { session, plan } = store.shown;
    document.title = `${plan.title || "Untitled plan"}, Spanwright`;
    if (session === before) return;
    if (session.task !== before.task && taskOfHash() !== session.task) location.hash = session.task;
    if (session.theme !== before.theme) {
      root.dataset.theme = session.theme;
      if (!bySystem) keepTheme(session.theme);
    }
    if (session.keys !== before.keys) keepKeys(session.keys);
    before = session;
  });
  // Either may have changed while the plan was on its way.
  root.dataset.theme = before.theme;
  followSystem();
}

/** Opening by the button and by dropping a file on the page; saving as a download. */
function followFiles(store: Store): void {
  const take = async (file: File | undefined): Promise<void> => {
    if (!file) return;
    const result = await opened(file);
    if ("plan" in result) {
      app.faults = result.warnings.length > 0 ? { title: `Notes on ${file.name}`, lines: result.warnings } : null;
      store.open(result.plan, result.plan.title || file.name);
    } else app.faults = result;
  };
  app.actions = {
    open: () => void chosenFile().then(take),
    save: () => store.say(`Saved as ${saved(store.plan, new Date().toISOString())}.`, null),
  };
  const holdsFile = (event: DragEvent): boolean => event.dataTransfer?.types.includes("Files") ?? false;
  window.addEventListener("dragover", (event) => {
    if (!holdsFile(event)) return;
    event.preventDefault();
    app.over = true;
  });
  window.addEventListener("dragleave", (event) => {
    if (event.relatedTarget === null) app.over = false;
  });
  window.addEventListener("drop", (event) => {
    if (!holdsFile(event)) return;
    event.preventDefault();
    app.over = false;
    void take(event.dataTransfer?.files[0]);
  });
}
