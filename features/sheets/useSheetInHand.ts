import { useMemo } from "react";
import type { Song } from "@/shared/contract/song";
import type { Instrument } from "@/shared/instruments/instrument";
import type { KeyName } from "@/shared/music/keyName";
import type { SheetTune } from "@/shared/sheets/sheet";
import { askedWay, wayAddress, type WayMoves } from "@/shared/ways/askedWay";
import type { Way } from "@/shared/ways/way";
import { keyChoices, sheetOf, writtenKey, type SheetArrangement, type SheetParams } from "./sheetInHand";

export interface SheetInHandOptions {
  song: Song;
  key: KeyName;
  shift: number;
  singer: string | null;
  instrument: Instrument;
  /** best first; undefined while they are searched */
  ways: readonly Way[] | undefined;
  asked: SheetParams;
  kept: WayMoves | null;
  /** kept arrangements of the song in this key on this instrument */
  arrangements?: readonly SheetArrangement[];
  /** where it lies in the singer's voice */
  tune?: SheetTune | null;
  /** changes what the address asks for */
  ask: (change: SheetParams) => void;
}

/** The sheet of a song in a key on an instrument, and what may be chosen instead. */
export function useSheetInHand(from: SheetInHandOptions) {
  const { song, key, shift, singer, instrument, ways, asked, kept, arrangements = [], tune = null, ask } = from;
  const way = useMemo(() => askedWay(ways ?? [], asked, kept), [ways, asked, kept]);
  const fitting = way ? arrangements.filter((each) => idOf(each.way) === idOf(way)) : [];
  const arrangement = fitting.find(({ id }) => id === asked.arrangement) ?? null;
  const written = writtenKey(song);
  const keyed = written !== null;
  const { tonic, mode } = key;
  const sheet = useMemo(() => {
    const sounding = keyed ? { tonic, mode } : null;
    return sheetOf({ song, key: sounding, shift, singer, instrument, way, arrangement, tune });
  }, [song, keyed, tonic, mode, shift, singer, instrument, way, arrangement, tune]);
  const keys = written === null ? [] : keyChoices(written, shift);
  const now = {
    ...(written === null ? null : { key: tonic, shift: String(shift) }),
    instrument: instrument.id,
    ...(way ? wayAddress(way) : null),
    ...(arrangement ? { arrangement: arrangement.id } : null),
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
        if (chosen) ask({ ...wayAddress(chosen), ...noArrangement });
      },
      arrangements:
        fitting.length === 0
          ? []
          : [
              { value: "", label: "The way's own shapes" },
              ...fitting.map(({ id, name }) => ({ value: id, label: name })),
            ],
      arrangementNow: arrangement?.id ?? "",
      onArrangement: (id: string) => ask(id === "" ? noArrangement : { arrangement: id }),
    },
  };
}

function idOf(way: WayMoves): string {
  return Object.values(wayAddress(way)).join(" ");
}

const noArrangement = { arrangement: undefined } as unknown as SheetParams;

/** In another key or on another instrument the way is found anew. */
const noWay = {
  retune: undefined,
  capo: undefined,
  shapes: undefined,
  arrangement: undefined,
} as unknown as SheetParams;
