/** Called between steps of a long job with the fraction done, 0 to 1. It may yield to the event loop, and throws to cancel. */
export type Checkpoint = (done: number) => Promise<void> | void;
