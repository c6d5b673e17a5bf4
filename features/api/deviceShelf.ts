import type { SongVersion } from "@/shared/contract/songVersion";
import { withHistory } from "@/shared/contract/decisionHistory";
import { ApiError } from "./apiError";
import { deviceHistory } from "./deviceHistory";
import { indexedDbStorage, type DeviceItems, type DeviceStorage } from "./deviceStorage";
import type { Collection, Items, Shelf } from "./items";
import { sameData } from "./sameData";
import { changedElsewhere, completeSong, sameContent, sameSong } from "./songRevision";

/** The shelf of a visitor, plus what moving it needs. */
export interface DeviceShelf extends Shelf {
  /** Lets go of one item, unless it was changed since it was read. */
  release<C extends Collection>(name: C, item: Items[C]): Promise<boolean>;
  /** Puts a song of the demonstration here, with its earlier states, the oldest first; nothing where it is already. */
  seed(song: Items["songs"], earlier: readonly Omit<SongVersion, "id">[]): Promise<void>;
  /** A copy of the demonstration exactly as it was first put here. */
  isAsSeeded(song: Items["songs"]): Promise<boolean>;
  /** Earlier states of a song, newest first. */
  versions(songId: string): Promise<SongVersion[]>;
}

type Readable = Pick<DeviceItems, "get" | "list">;

const keyOf = (name: string, id: string) => `${name}/${id}`;
const unknownReference = (what: string) =>
  new ApiError(422, "unknown-reference", `The ${what} this belongs to is not on your shelf any more.`);

/** An item as it is today, whenever it was kept. */
const asToday = <C extends Collection>(name: C, kept: unknown) => {
  if (name === "songs") return completeSong(kept) as Items[C];
  return (name === "decisions" ? { earlier: [], ...(kept as object) } : kept) as Items[C];
};

const listIn = async <C extends Collection>(items: Readable, name: C): Promise<Items[C][]> =>
  (await items.list(keyOf(name, ""))).map((kept) => asToday(name, kept));

/** A song without what differs from copy to copy; that it was played makes it no work of one's own. */
const contentOf = (song: Items["songs"]) => ({
  ...completeSong(song),
  id: null,
  createdAt: null,
  playedAt: null,
  revision: null,
});

async function checkReferences(items: Readable, name: Collection, item: Items[Collection]): Promise<void> {
  const has = async (parent: Collection, id: string) => (await items.get(keyOf(parent, id))) !== undefined;
  if (name === "takes" && !(await has("voices", (item as Items["takes"]).voiceId))) throw unknownReference("voice");
  if (name === "line-ups" || name === "arrangements") {
    if (!(await has("songs", (item as Items["line-ups" | "arrangements"]).songId))) throw unknownReference("song");
  }
  if (name !== "decisions" && name !== "tries") return;
  const { songId, voiceId } = item as Items["decisions" | "tries"];
  if (!(await has("songs", songId))) throw unknownReference("song");
  if (voiceId !== null && !(await has("voices", voiceId))) throw unknownReference("voice");
}

/** The first copy of a demonstration song is the one the product put here; later ones may be a person's work. */
async function rememberSeed(items: DeviceItems, song: Items["songs"]): Promise<void> {
  if (song.demo === null || (await items.get(keyOf("seeded", song.demo))) !== undefined) return;
  items.set(keyOf("seeded", song.demo), contentOf(song));
}

/** Counts the revision up, keeps the state before, and refuses a change of anything but the kept revision. */
async function putSong(items: DeviceItems, song: Items["songs"], version: boolean): Promise<Items["songs"]> {
  const found = await items.get(keyOf("songs", song.id));
  if (found === undefined) {
    await rememberSeed(items, song);
    return setSong(items, { ...song, revision: 1 });
  }
  const kept = completeSong(found);
  if (sameSong(kept, song)) return kept;
  if (song.revision !== kept.revision) throw changedElsewhere();
  if (!sameContent(kept, song)) await deviceHistory.keep(items, kept, version);
  return setSong(items, { ...song, revision: kept.revision + 1 });
}

function setSong(items: DeviceItems, song: Items["songs"]): Items["songs"] {
  items.set(keyOf("songs", song.id), song);
  return song;
}

/** One for each song and voice: it takes the place of others and keeps their history. */
async function putDecision(items: DeviceItems, sent: Items["decisions"]): Promise<Items["decisions"]> {
  const replaced = (await listIn(items, "decisions")).filter(
    ({ songId, voiceId }) => songId === sent.songId && voiceId === sent.voiceId,
  );
  for (const { id } of replaced) items.delete(keyOf("decisions", id));
  const decision = replaced.reduce(withHistory, sent);
  items.set(keyOf("decisions", sent.id), decision);
  return decision;
}

/** One for each song: it takes the place of others. */
async function putLineUp(items: DeviceItems, lineUp: Items["line-ups"]): Promise<Items["line-ups"]> {
  for (const { id, songId } of await listIn(items, "line-ups"))
    if (songId === lineUp.songId) items.delete(keyOf("line-ups", id));
  items.set(keyOf("line-ups", lineUp.id), lineUp);
  return lineUp;
}

/** Takes an item and what goes with it away. */
async function takeAway(items: DeviceItems, name: Collection, id: string): Promise<void> {
  items.delete(keyOf(name, id));
  if (name === "songs") {
    deviceHistory.forget(items, id);
    for (const child of ["decisions", "tries", "line-ups", "arrangements"] as const)
      for (const { id: childId, songId } of await listIn(items, child))
        if (songId === id) items.delete(keyOf(child, childId));
  }
  if (name === "voices") {
    for (const child of ["takes", "tries"] as const)
      for (const { id: childId, voiceId } of await listIn(items, child))
        if (voiceId === id) items.delete(keyOf(child, childId));
    await freeDecisions(items, id);
  }
}

/** Decisions of a voice that goes become everybody's, except where a song has one for everybody already. */
async function freeDecisions(items: DeviceItems, voiceId: string): Promise<void> {
  const decisions = await listIn(items, "decisions");
  for (const decision of decisions.filter((each) => each.voiceId === voiceId)) {
    const key = keyOf("decisions", decision.id);
    if (decisions.some((each) => each.songId === decision.songId && each.voiceId === null)) items.delete(key);
    else items.set(key, { ...decision, voiceId: null });
  }
}

/** Keeps a visitor's belongings on this device. Refuses the same references and the same late changes as the server. */
function createDeviceShelf(storage: DeviceStorage): DeviceShelf {
  return {
    list: (name) => storage.read((items) => listIn(items, name)),
    get: (name, id) =>
      storage.read(async (items) => {
        const item = await items.get(keyOf(name, id));
        if (item === undefined) throw ApiError.notFound();
        return asToday(name, item);
      }),
    put: <C extends Collection>(name: C, item: Items[C], { version = false } = {}) =>
      storage.change(async (items) => {
        await checkReferences(items, name, item);
        if (name === "songs") return (await putSong(items, item as Items["songs"], version)) as Items[C];
        if (name === "decisions") return (await putDecision(items, item as Items["decisions"])) as Items[C];
        if (name === "line-ups") return (await putLineUp(items, item as Items["line-ups"])) as Items[C];
        items.set(keyOf(name, item.id), item);
        return item;
      }),
    remove: (name, id) => storage.change((items) => takeAway(items, name, id)),
    release: (name, item) =>
      storage.change(async (items) => {
        const kept = await items.get(keyOf(name, item.id));
        if (kept === undefined || !sameData(asToday(name, kept), item)) return false;
        items.delete(keyOf(name, item.id));
        if (name === "songs") deviceHistory.forget(items, item.id);
        return true;
      }),
    seed: (song, earlier) =>
      storage.change(async (items) => {
        if ((await items.get(keyOf("songs", song.id))) !== undefined) return;
        await putSong(items, song, false);
        deviceHistory.bring(items, song.id, earlier);
      }),
    async isAsSeeded(song) {
      const { demo } = song;
      if (demo === null) return false;
      const seeded = await storage.read((items) => items.get(keyOf("seeded", demo)));
      return seeded !== undefined && sameData(contentOf(seeded as Items["songs"]), contentOf(song));
    },
    versions: (songId) =>
      storage.read(async (items) => {
        if ((await items.get(keyOf("songs", songId))) === undefined) throw ApiError.notFound();
        return deviceHistory.read(items, songId);
      }),
  };
}

/** This device's shelf in IndexedDB. It survives a reload and is shared by all tabs. */
export const deviceShelf = createDeviceShelf(indexedDbStorage);
