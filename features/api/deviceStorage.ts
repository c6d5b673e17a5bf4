import { createStore, delMany, entries, get, promisifyRequest, set, type UseStore } from "idb-keyval";
import { ApiError } from "./apiError";

/** What the device shelf needs of a key-value store. Every item has its own key, so that two tabs never overwrite each other's work. */
export interface DeviceStorage {
  get(key: string): Promise<unknown>;
  set(key: string, value: unknown): Promise<void>;
  delete(keys: string[]): Promise<void>;
  entries(): Promise<[string, unknown][]>;
  /** Reads and deletes in one step, so that an edit made meanwhile in another tab is not lost. */
  deleteIf(key: string, test: (value: unknown) => boolean): Promise<boolean>;
}

function refusal(error: unknown): ApiError {
  if (error instanceof DOMException && error.name === "QuotaExceededError")
    return new ApiError(
      0,
      "device-full",
      "This device has no room left. Free some space and try again; what was kept before is safe.",
    );
  return new ApiError(
    0,
    "no-storage",
    "This browser lets no page keep anything here; a private window may be the reason. Use a normal window, or sign in to keep your work.",
  );
}

let store: UseStore | null = null;

async function attempt<T>(work: (store: UseStore) => Promise<T>): Promise<T> {
  try {
    store ??= createStore("larkspan", "shelf");
    return await work(store);
  } catch (error) {
    throw refusal(error);
  }
}

/** IndexedDB. Rejects with "no-storage" where the browser refuses it and "device-full" where the quota is used up. */
export const indexedDbStorage: DeviceStorage = {
  get: (key) => attempt((kept) => get(key, kept)),
  set: (key, value) => attempt((kept) => set(key, value, kept)),
  delete: (keys) => attempt((kept) => delMany(keys, kept)),
  entries: () => attempt((kept) => entries<string>(kept)),
  deleteIf: (key, test) =>
    attempt((kept) =>
      kept("readwrite", async (items) => {
        const fits = test(await promisifyRequest(items.get(key)));
        if (fits) items.delete(key);
        await promisifyRequest(items.transaction);
        return fits;
      }),
    ),
};
