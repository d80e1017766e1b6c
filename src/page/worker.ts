import { dispatcher } from "../tasks/run.ts";
import { runners } from "../tasks/runners.ts";

/** Posts and receives only; what it does stands in tasks/. The pause is a message to itself, which timers do not slow down. */
const channel = new MessageChannel();
let resume: (() => void) | undefined;
channel.port1.onmessage = () => resume?.();
const pause = (): Promise<void> =>
  new Promise((resolve) => {
    resume = resolve;
    channel.port2.postMessage(null);
  });

const handle = dispatcher(runners(), (message, transfer) => self.postMessage(message, { transfer: [...transfer] }), pause);
self.onmessage = (event) => void handle(event.data);
