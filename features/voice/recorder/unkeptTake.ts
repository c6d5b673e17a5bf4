import { createStore, delMany, entries, get, keys, set } from "idb-keyval";
import type { HeardTake } from "./recorder";

/** Sound of a take that a reload cut off, as far as it had reached the device's storage. */
export interface CutOffTake {
  id: string;
  sungAt: string;
  sampleRate: number;
  pcm: Float32Array<ArrayBuffer>;
}

interface Head {
  id: string;
  sungAt: string;
  sampleRate: number;
}

const usualMark = "larkspan.take";
const dayMs = 86_400_000;
const storeOf = (() => {
  let store: ReturnType<typeof createStore> | null = null;
  return () => (store ??= createStore("larkspan-unkept-take", "parts"));
})();
const headKey = (id: string) => `head/${id}`;
const resultKey = (id: string) => `result/${id}`;
const partKey = (id: string, index: number) => `part/${id}/${String(index).padStart(4, "0")}`;

/** The id of the take this tab has open; another tab's take is none of its business. Pages of their own kind have their own mark. */
export function takeOfThisTab(mark = usualMark): string | null {
  try {
    return sessionStorage.getItem(mark);
  } catch {
    return null;
  }
}

export function markTakeOfThisTab(id: string | null, mark = usualMark): void {
  try {
    if (id === null) sessionStorage.removeItem(mark);
    else sessionStorage.setItem(mark, id);
  } catch {
    // A browser that forbids storage only loses the safety against a reload.
  }
}

export async function beginUnkept(head: Head): Promise<void> {
  await set(headKey(head.id), head, storeOf());
}

export async function appendUnkept(id: string, index: number, pcm: Float32Array<ArrayBuffer>): Promise<void> {
  await set(partKey(id, index), pcm, storeOf());
}

/** Puts the judged take in the place of its loose parts. */
export async function saveUnkept(take: HeardTake): Promise<void> {
  await set(resultKey(take.id), take, storeOf());
  await dropWhere((key) => key === headKey(take.id) || key.startsWith(`part/${take.id}/`));
}

export async function readUnkept(id: string): Promise<{ result: HeardTake } | { cutOff: CutOffTake } | null> {
  const result = await get<HeardTake>(resultKey(id), storeOf());
  if (result) return { result };
  const head = await get<Head>(headKey(id), storeOf());
  if (!head) return null;
  const parts = (await entries<string, Float32Array>(storeOf()))
    .filter(([key]) => key.startsWith(`part/${id}/`))
    .sort(([a], [b]) => (a < b ? -1 : 1))
    .map(([, part]) => part);
  const pcm = new Float32Array(parts.reduce((length, part) => length + part.length, 0));
  let at = 0;
  for (const part of parts) {
    pcm.set(part, at);
    at += part.length;
  }
  return { cutOff: { ...head, pcm } };
}

/** Erases one take's sound and numbers from this device. */
export async function dropUnkept(id: string): Promise<void> {
  await dropWhere((key) => key === headKey(id) || key === resultKey(id) || key.startsWith(`part/${id}/`));
}

/** Erases what closed tabs left behind more than a day before `nowMs`. */
export async function dropStale(nowMs: number): Promise<void> {
  const old = new Set<string>();
  for (const [key, value] of await entries<string, { sungAt?: string }>(storeOf())) {
    const [kind, id = ""] = key.split("/");
    if (kind !== "part" && value.sungAt && nowMs - Date.parse(value.sungAt) > dayMs) old.add(id);
  }
  await dropWhere((key) => old.has(key.split("/")[1] ?? ""));
}

async function dropWhere(matches: (key: string) => boolean): Promise<void> {
  await delMany((await keys<string>(storeOf())).filter(matches), storeOf());
}
