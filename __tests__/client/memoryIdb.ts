/** Stands in for idb-keyval: one Map, which a test may also read, fill or refuse. */
export const kept = new Map<string, unknown>();

let refused: Error | null = null;

/** From now on the browser keeps nothing (or keeps things again, with null). */
export function refuseStorage(reason: Error | null): void {
  refused = reason;
}

// Like the structured clone of IndexedDB: what comes out is never the object that went in.
const copy = <T>(value: T): T => (value === undefined ? value : (JSON.parse(JSON.stringify(value)) as T));

interface Request<T> {
  result: T;
}

interface Range {
  lower: string;
  upper: string;
}

interface Store {
  get(key: string): Request<unknown>;
  getAll(range: Range): Request<unknown[]>;
  put(value: unknown, key: string): void;
  delete(key: string): void;
  transaction: Request<null> & { abort(): void };
}

// jsdom has no IndexedDB.
Object.assign(globalThis, { IDBKeyRange: { bound: (lower: string, upper: string): Range => ({ lower, upper }) } });

let queue: Promise<unknown> = Promise.resolve();

/** As IndexedDB has it: one transaction after the other, and an aborted one leaves no trace. */
async function transact<T>(work: (store: Store) => T): Promise<Awaited<T>> {
  const turn = queue.then(() => {
    if (refused) throw refused;
    const before = [...kept];
    const undo = () => {
      kept.clear();
      for (const [key, value] of before) kept.set(key, value);
    };
    return work({
      get: (key) => ({ result: copy(kept.get(key)) }),
      getAll: ({ lower, upper }) => ({
        result: [...kept].filter(([key]) => key >= lower && key <= upper).map(([, value]) => copy(value)),
      }),
      put: (value, key) => void kept.set(key, copy(value)),
      delete: (key) => void kept.delete(key),
      transaction: { result: null, abort: undo },
    });
  });
  queue = turn.then(
    () => undefined,
    () => undefined,
  );
  return await turn;
}

/** The part of idb-keyval that the device shelf uses. */
export const memoryIdb = {
  createStore:
    () =>
    <T>(_mode: string, work: (store: Store) => T) =>
      transact(work),
  promisifyRequest: async <T>(request: Request<T>) => request.result,
};
