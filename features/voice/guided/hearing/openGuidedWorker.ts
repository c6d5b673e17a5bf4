/** Bundled apart like the worker of takes (metro.config.js). */
export function openGuidedWorker(): Worker {
  return new Worker("/worklets/guidedWorker.js");
}
