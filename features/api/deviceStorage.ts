import { createStore, promisifyRequest, type UseStore } from "idb-keyval";
import { ApiError } from "./apiError";

/** What one step reads and writes. Await nothing but these within a step: the browser ends it otherwise. */
export interface DeviceItems {
  get(key: string): Promise<unknown>;
  /** all whose key begins so */
  list(prefix: string): Promise<unknown[]>;
  set(key: string, value: unknown): void;
  delete(key: string): void;
}

/** What the device shelf needs of a key-value store. Every item has its own key, so that two tabs never overwrite each other's work. */
export interface DeviceStorage {
  read<T>(work: (items: Pick<DeviceItems, "get" | "list">) => Promise<T>): Promise<T>;
  /** Reads and writes in one step: no other tab comes in between, and what is thrown undoes all of it. */
  change<T>(work: (items: DeviceItems) => Promise<T>): Promise<T>;
}

function refusal(error: unknown): ApiError {
  if (error instanceof ApiError) return error;
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

function itemsOf(items: IDBObjectStore): DeviceItems {
  return {
    get: (key) => promisifyRequest<unknown>(items.get(key)),
    list: (prefix) => promisifyRequest<unknown[]>(items.getAll(IDBKeyRange.bound(prefix, `${prefix}\uffff`))),
    set: (key, value) => void items.put(value, key),
    delete: (key) => void items.delete(key),
  };
}

async function step<T>(mode: IDBTransactionMode, work: (items: DeviceItems) => Promise<T>): Promise<T> {
  try {
    store ??= createStore("larkspan", "shelf");
    return await store(mode, async (items) => {
      try {
        const result = await work(itemsOf(items));
        await promisifyRequest(items.transaction);
        return result;
      } catch (error) {
        abort(items.transaction);
        throw error;
      }
    });
  } catch (error) {
    throw refusal(error);
  }
}

function abort(transaction: IDBTransaction): void {
  try {
    transaction.abort();
  } catch {
    // The browser ended it already.
  }
}

/** IndexedDB. Rejects with "no-storage" where the browser refuses it and "device-full" where the quota is used up. */
export const indexedDbStorage: DeviceStorage = {
  read: (work) => step("readonly", work),
  change: (work) => step("readwrite", work),
};
