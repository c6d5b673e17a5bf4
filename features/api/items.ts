import type { Arrangement } from "@/shared/contract/arrangement";
import type { Decision } from "@/shared/contract/decision";
import type { OwnInstrument } from "@/shared/contract/instrument";
import type { PlayerWishes } from "@/shared/contract/playerWishes";
import type { LineUp } from "@/shared/contract/lineUp";
import type { Song } from "@/shared/contract/song";
import type { Take } from "@/shared/contract/take";
import type { Try } from "@/shared/contract/try";
import type { Voice } from "@/shared/contract/voice";

/** The owned collections and what they hold. */
export interface Items {
  voices: Voice;
  takes: Take;
  songs: Song;
  decisions: Decision;
  tries: Try;
  instruments: OwnInstrument;
  wishes: PlayerWishes;
  "line-ups": LineUp;
  arrangements: Arrangement;
}

export type Collection = keyof Items;

/** Parents stand before what refers to them. */
export const collections = [
  "voices",
  "takes",
  "songs",
  "decisions",
  "tries",
  "instruments",
  "wishes",
  "line-ups",
  "arrangements",
] as const satisfies readonly Collection[];

/** What may be asked for when something is kept. */
interface PutOptions {
  /** a song: keep the state before as a version, however young the newest one is */
  version?: boolean;
}

/** One person's belongings, wherever they are kept. Everything rejects with ApiError only. */
export interface Shelf {
  list<C extends Collection>(name: C): Promise<Items[C][]>;
  /** Rejects with 404 "not-found" where there is none. */
  get<C extends Collection>(name: C, id: string): Promise<Items[C]>;
  /**
   * Creates or replaces, by the item's own id, and gives what is kept. A song that was changed since it was read is not
   * overwritten: 409 "changed-elsewhere".
   */
  put<C extends Collection>(name: C, item: Items[C], options?: PutOptions): Promise<Items[C]>;
  /** Takes and tries go with their voice, decisions, tries, line-ups and arrangements with their song. Removing what is not there is no error. */
  remove(name: Collection, id: string): Promise<void>;
}
