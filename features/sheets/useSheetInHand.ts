import { useMemo } from "react";
import type { Song } from "@/shared/contract/song";
import type { Instrument } from "@/shared/instruments/instrument";
import type { KeyName } from "@/shared/music/keyName";
import type { Way } from "@/shared/ways/way";
import { chosenWay, keyChoices, sheetOf, wayParams, writtenKey, type SheetParams } from "./sheetInHand";

export interface SheetInHandOptions {
  song: Song;
  key: KeyName;
  shift: number;
  singer: string | null;
  instrument: Instrument;
  /** best first; undefined while they are searched */
  ways: readonly Way[] | undefined;
  asked: SheetParams;
  kept: Pick<Way, "retune" | "capo" | "shapeKey"> | null;
  /** changes what the address asks for */
  ask: (change: SheetParams) => void;
}

/** The sheet of a song in a key on an instrument, and what may be chosen instead. */
export function useSheetInHand(from: SheetInHandOptions) {
  const { song, key, shift, singer, instrument, ways, asked, kept, ask } = from;
  const way = useMemo(() => chosenWay(ways ?? [], asked, kept), [ways, asked, kept]);
  const written = writtenKey(song);
  const keyed = written !== null;
  const { tonic, mode } = key;
  const sheet = useMemo(() => {
    const sounding = keyed ? { tonic, mode } : null;
    return sheetOf({ song, key: sounding, shift, singer, instrument, way });
  }, [song, keyed, tonic, mode, shift, singer, instrument, way]);
  const keys = written === null ? [] : keyChoices(written, shift);
  const idOf = (each: Pick<Way, "retune" | "capo" | "shapeKey">) => Object.values(wayParams(each)).join(" ");
  const now = {
    ...(written === null ? null : { key: tonic, shift: String(shift) }),
    instrument: instrument.id,
    ...(way ? wayParams(way) : null),
  };
  return {
    sheet,
    way,
    /** the address of just this sheet */
    params: now,
    choices: {
      keys: keys.map((each) => ({ value: String(each.shift), label: each.label })),
      keyNow: String(shift),
      onKey: (value: string) => {
        const chosen = keys.find((each) => String(each.shift) === value);
        if (chosen) ask({ key: chosen.key.tonic, shift: value, ...noWay });
      },
      ways: (ways ?? []).map((each) => ({ value: idOf(each), label: each.title })),
      wayNow: way ? idOf(way) : "",
      onWay: (value: string) => {
        const chosen = ways?.find((each) => idOf(each) === value);
        if (chosen) ask(wayParams(chosen));
      },
    },
  };
}

/** In another key or on another instrument the way is found anew. */
const noWay = { retune: undefined, capo: undefined, shapes: undefined } as unknown as SheetParams;
