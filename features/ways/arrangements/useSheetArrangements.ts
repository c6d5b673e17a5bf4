import { useQuery } from "@tanstack/react-query";
import { useMemo } from "react";
import type { Song } from "@/shared/contract/song";
import type { Instrument } from "@/shared/instruments/instrument";
import { sheetStrokes } from "@/shared/sheets/sheetStrokes";
import { fitsInstrument, metreFor, patternFor } from "./arrangementDraft";
import { arrangementQueries } from "./arrangementQueries";

/** The kept arrangements of a song in one key on one instrument, as a sheet takes them. */
export function useSheetArrangements(song: Song, shift: number, instrument: Instrument) {
  const { data } = useQuery(arrangementQueries.ofSong(song.id));
  return useMemo(() => {
    const fitting = (data ?? []).filter(
      (each) => each.shift === shift && each.instrument === instrument.id && fitsInstrument(each, instrument),
    );
    return fitting.map(({ id, name, way, chords, pattern }) => {
      const strokes = sheetStrokes(patternFor(song, pattern), metreFor(song));
      return { id, name, way, chords, strokes };
    });
  }, [data, song, shift, instrument]);
}
