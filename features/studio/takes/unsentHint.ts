const hint = "larkspan.unsent-takes";

/** Whether recordings wait on this device, told without opening their store. */
export const unsentHint = {
  note(some: boolean): void {
    try {
      if (some) localStorage.setItem(hint, "1");
      else localStorage.removeItem(hint);
    } catch {
      // Without it the takes go on when a page of the studio is opened.
    }
  },
  some(): boolean {
    try {
      return localStorage.getItem(hint) !== null;
    } catch {
      return false;
    }
  },
};
