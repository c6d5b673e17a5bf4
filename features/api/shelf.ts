import { deviceShelf } from "./deviceShelf";
import type { Shelf } from "./items";
import { serverShelf } from "./serverShelf";
import { session } from "./session";

async function place(): Promise<Shelf> {
  return (await session.settled()).status === "signed-in" ? serverShelf : deviceShelf;
}

/** Where belongings are read and written: the account of the signed-in, this device for visitors. Waits until that is known. */
export const shelf: Shelf = {
  list: async (name) => (await place()).list(name),
  get: async (name, id) => (await place()).get(name, id),
  put: async (name, item, options) => (await place()).put(name, item, options),
  remove: async (name, id) => (await place()).remove(name, id),
};
