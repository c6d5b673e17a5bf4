import { ApiError } from "./apiError";
import { indexedDbStorage, type DeviceStorage } from "./deviceStorage";
import { sameData } from "./sameData";
import type { Collection, Items, Shelf } from "./items";

/** The shelf of a visitor, plus what moving it needs. */
export interface DeviceShelf extends Shelf {
  /** Lets go of one item, unless it was changed since it was read. */
  release<C extends Collection>(name: C, item: Items[C]): Promise<boolean>;
  /** A copy of the demonstration exactly as it was first put here. */
  isAsSeeded(song: Items["songs"]): Promise<boolean>;
}

const keyOf = (name: string, id: string) => `${name}/${id}`;
const unknownReference = (what: string) =>
  new ApiError(422, "unknown-reference", `The ${what} this belongs to is not on your shelf any more.`);

/** A song without what differs from copy to copy. */
const contentOf = (song: Items["songs"]) => ({ ...song, id: null, createdAt: null });

/** Keeps a visitor's belongings on this device. Refuses the same references as the server. */
function createDeviceShelf(storage: DeviceStorage): DeviceShelf {
  const list = async <C extends Collection>(name: C): Promise<Items[C][]> =>
    (await storage.entries()).filter(([key]) => key.startsWith(`${name}/`)).map(([, item]) => item as Items[C]);

  const has = async (name: Collection, id: string) => (await storage.get(keyOf(name, id))) !== undefined;

  async function checkReferences(name: Collection, item: Items[Collection]): Promise<void> {
    if (name === "takes" && !(await has("voices", (item as Items["takes"]).voiceId))) throw unknownReference("voice");
    if (name !== "decisions") return;
    const { songId, voiceId } = item as Items["decisions"];
    if (!(await has("songs", songId))) throw unknownReference("song");
    if (voiceId !== null && !(await has("voices", voiceId))) throw unknownReference("voice");
  }

  /** The first copy of a demonstration song is the one the product put here; later ones may be a person's work. */
  async function rememberSeed(song: Items["songs"]): Promise<void> {
    if (song.demo === null || (await storage.get(keyOf("seeded", song.demo))) !== undefined) return;
    await storage.set(keyOf("seeded", song.demo), contentOf(song));
  }

  return {
    list,
    async get<C extends Collection>(name: C, id: string) {
      const item = await storage.get(keyOf(name, id));
      if (item === undefined) throw ApiError.notFound();
      return item as Items[C];
    },
    async put(name, item) {
      await checkReferences(name, item);
      if (name === "songs") await rememberSeed(item as Items["songs"]);
      await storage.set(keyOf(name, item.id), item);
      return item;
    },
    async remove(name, id) {
      const gone = [keyOf(name, id)];
      if (name === "songs") {
        for (const decision of await list("decisions"))
          if (decision.songId === id) gone.push(keyOf("decisions", decision.id));
      }
      if (name === "voices") {
        for (const take of await list("takes")) if (take.voiceId === id) gone.push(keyOf("takes", take.id));
        for (const decision of await list("decisions"))
          if (decision.voiceId === id)
            await storage.set(keyOf("decisions", decision.id), { ...decision, voiceId: null });
      }
      await storage.delete(gone);
    },
    release: (name, item) => storage.deleteIf(keyOf(name, item.id), (kept) => sameData(kept, item)),
    async isAsSeeded(song) {
      return song.demo !== null && sameData(await storage.get(keyOf("seeded", song.demo)), contentOf(song));
    },
  };
}

/** This device's shelf in IndexedDB. It survives a reload and is shared by all tabs. */
export const deviceShelf = createDeviceShelf(indexedDbStorage);
