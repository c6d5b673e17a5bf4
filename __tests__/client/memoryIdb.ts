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

async function open<T>(work: (items: Map<string, unknown>) => T): Promise<T> {
  if (refused) throw refused;
  return work(kept);
}

/** The part of idb-keyval that the device shelf uses. */
export const memoryIdb = {
  createStore:
    () =>
    <T>(
      _mode: string,
      work: (store: { get(key: string): Request<unknown>; delete(key: string): void; transaction: Request<null> }) => T,
    ) =>
      open((items) =>
        work({
          get: (key) => ({ result: copy(items.get(key)) }),
          delete: (key) => void items.delete(key),
          transaction: { result: null },
        }),
      ),
  promisifyRequest: async <T>(request: Request<T>) => request.result,
  get: (key: string) => open((items) => copy(items.get(key))),
  set: (key: string, value: unknown) => open((items) => void items.set(key, copy(value))),
  delMany: (keys: string[]) => open((items) => keys.forEach((key) => items.delete(key))),
  entries: () => open((items) => [...items].map(([key, value]) => [key, copy(value)])),
};
