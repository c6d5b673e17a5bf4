/** The worker is bundled apart (metro.config.js), because Metro moves what it shares with a page out of its reach. */
export function openTakeWorker(): Worker {
  return new Worker("/worklets/takeWorker.js");
}
