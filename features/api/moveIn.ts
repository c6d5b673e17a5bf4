import { joined } from "@/shared/contract/decisionHistory";
import { joinedLineUps } from "@/shared/contract/lineUp";
import { ApiError } from "./apiError";
import { readBelongings, type Belongings } from "./belongings";
import { deviceShelf } from "./deviceShelf";
import { collections, type Collection, type Items } from "./items";
import { queryClient } from "./queryClient";
import { serverShelf } from "./serverShelf";
import { session } from "./session";

/** An item that stayed on the device, and why, in words. */
interface StayedBehind {
  name: Collection;
  id: string;
  title: string;
  reason: string;
}

/** "stopped" means that the server went away in between: the rest follows at the next start. */
export interface MoveInState {
  status: "idle" | "moving" | "done" | "stopped";
  moved: number;
  total: number;
  stayed: StayedBehind[];
}

/** How the person came in. A new account receives the demonstration too; an existing one, which signing up with its password opens, has had its own. */
type Entry = "sign-up" | "sign-in" | "resume";

let state: MoveInState = { status: "idle", moved: 0, total: 0, stayed: [] };
let running: Promise<MoveInState> | null = null;
const listeners = new Set<() => void>();

function publish(change: Partial<MoveInState>): void {
  state = { ...state, ...change };
  for (const listener of [...listeners]) listener();
}

function titleOf(name: Collection, item: Items[Collection]): string {
  if ("title" in item) return item.title;
  if ("name" in item) return item.name;
  if (name === "takes") return `A take of ${(item as Items["takes"]).sungAt.slice(0, 10)}`;
  if (name === "tries") return `A key tried on ${(item as Items["tries"]).sungAt.slice(0, 10)}`;
  if (name === "wishes") return "Your wishes and the shapes you know";
  return name === "line-ups" ? "Who plays a song" : "The key you chose for a song";
}

function reasonOf(error: ApiError): string {
  if (error.status === 404) return "It belongs to another account.";
  return error.fields[0]?.message ?? error.message;
}

/** An item cannot arrive before what it refers to. */
function parentsOf(name: Collection, item: Items[Collection]): string[] {
  if (name === "takes") return [(item as Items["takes"]).voiceId];
  if (name === "line-ups" || name === "arrangements") return [(item as Items["line-ups" | "arrangements"]).songId];
  if (name !== "decisions" && name !== "tries") return [];
  const { songId, voiceId } = item as Items["decisions" | "tries"];
  return voiceId === null ? [songId] : [songId, voiceId];
}

/**
 * Puts a song into the account. Where the account holds another state of it, from an earlier start that broke off, the
 * later one stays the present one and the other becomes a version: nothing is lost.
 */
async function putSong(song: Items["songs"]): Promise<void> {
  try {
    // The device counts changes for itself: its revision says nothing about the account's.
    await serverShelf.put("songs", { ...song, revision: 0 });
  } catch (error) {
    if (!(error instanceof ApiError && error.code === "changed-elsewhere")) throw error;
    const there = await serverShelf.get("songs", song.id);
    const put = await serverShelf.put("songs", { ...song, revision: there.revision }, { version: true });
    // In its first revision it is this device's own earlier copy; in a later one it was worked on in the account.
    if (there.revision > 1) await serverShelf.put("songs", { ...there, revision: put.revision }, { version: true });
  }
}

/**
 * Puts a decision into the account. Where the account has decided for the same song and voice, the later choice is the
 * present one and the other stands in its history.
 */
async function putDecision(decision: Items["decisions"]): Promise<void> {
  const { songId, voiceId } = decision;
  const there = (await serverShelf.list("decisions")).find(
    (each) => each.songId === songId && each.voiceId === voiceId,
  );
  await serverShelf.put("decisions", there ? joined(there, decision) : decision);
}

/** Puts a line-up into the account; where the account has one for the song, all of both play. */
async function putLineUp(lineUp: Items["line-ups"]): Promise<void> {
  const there = (await serverShelf.list("line-ups")).find(({ songId }) => songId === lineUp.songId);
  await serverShelf.put("line-ups", there ? joinedLineUps(there, lineUp) : lineUp);
}

async function isSuperfluous(entry: Entry, belongings: Belongings): Promise<(song: Items["songs"]) => boolean> {
  if (belongings.untouched.size === 0) return () => false;
  if (entry === "sign-in") return (song) => belongings.untouched.has(song.id);
  const there = new Set((await serverShelf.list("songs")).map((song) => song.demo));
  return (song) => belongings.untouched.has(song.id) && there.has(song.demo);
}

async function moveAll(entry: Entry): Promise<void> {
  const owner = session.current().account?.id;
  const belongings = await readBelongings();
  const total = collections.reduce((sum, name) => sum + belongings.items[name].length, 0);
  if (total > 0) publish({ status: "moving", total });
  const superfluous = await isSuperfluous(entry, belongings);
  const stayed = new Map<string, StayedBehind>();

  async function moveOne<C extends Collection>(name: C, item: Items[C]): Promise<void> {
    if (parentsOf(name, item).some((id) => stayed.has(id))) {
      stayed.set(item.id, { name, id: item.id, title: titleOf(name, item), reason: "What it belongs to stayed here." });
      return;
    }
    try {
      if (name === "decisions") await putDecision(item as Items["decisions"]);
      else if (name === "line-ups") await putLineUp(item as Items["line-ups"]);
      else if (name !== "songs") await serverShelf.put(name, item);
      else if (!superfluous(item as Items["songs"])) await putSong(item as Items["songs"]);
    } catch (error) {
      if (!(error instanceof ApiError) || (!error.refused && error.status < 500)) throw error;
      stayed.set(item.id, { name, id: item.id, title: titleOf(name, item), reason: reasonOf(error) });
      return;
    }
    await deviceShelf.release(name, item);
    publish({ moved: state.moved + 1 });
  }

  for (const name of collections)
    for (const item of belongings.items[name]) {
      if (session.current().account?.id !== owner)
        throw new ApiError(401, "no-session", "You signed out while your things were moving.");
      await moveOne(name, item);
      publish({ stayed: [...stayed.values()] });
    }
}

/** One tab at a time; without locks two tabs only repeat each other's idempotent requests. */
async function alone(work: () => Promise<void>): Promise<void> {
  const locks = typeof navigator === "undefined" ? undefined : navigator.locks;
  await (locks ? locks.request("larkspan-move-in", work) : work());
}

async function run(entry: Entry): Promise<MoveInState> {
  publish({ moved: 0, total: 0, stayed: [] });
  try {
    await alone(() => moveAll(entry));
    publish({ status: "done" });
  } catch (error) {
    // A browser that keeps nothing has nothing to move.
    publish({ status: error instanceof ApiError && error.code === "no-storage" ? "done" : "stopped" });
  }
  if (state.moved > 0) void queryClient.invalidateQueries();
  return state;
}

function start(entry: Entry): Promise<MoveInState> {
  running ??= run(entry).finally(() => {
    running = null;
  });
  return running;
}

/**
 * Moves what this device keeps into the account. Never rejects: the outcome is in the state.
 * Each item leaves the device only after the server acknowledged it, so it can be repeated after any interruption.
 */
export const moveIn = {
  state: () => state,
  subscribe(listener: () => void): () => void {
    listeners.add(listener);
    return () => void listeners.delete(listener);
  },
  afterSignUp: () => start("sign-up"),
  afterSignIn: () => start("sign-in"),
  resume: () => start("resume"),
};
