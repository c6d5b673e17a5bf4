import type { SharedSheet } from "@/shared/contract/sheetLink";
import type { Song } from "@/shared/contract/song";
import { fretName } from "@/shared/instruments/frets";
import type { Instrument } from "@/shared/instruments/instrument";
import { keyFifths, type KeyName } from "@/shared/music/keyName";
import { keySign, movedKey } from "@/shared/music/keyWords";
import { shortMove } from "@/shared/music/moveWords";
import { glyphs, noteName } from "@/shared/music/pitch";
import type { Sheet, SheetStrokes, SheetTune } from "@/shared/sheets/sheet";
import { chartChords, parseChart } from "@/shared/songs/chart";
import { partOrder } from "@/shared/songs/partOrder";
import { playedChords } from "@/shared/songs/playedChords";
import type { WayAddress, WayMoves } from "@/shared/ways/askedWay";
import type { Shape, Way } from "@/shared/ways/way";

/** What an address may ask for. All of it as it stands there. */
export interface SheetParams extends WayAddress {
  key?: string;
  shift?: string;
  instrument?: string;
  /** id of a kept arrangement */
  arrangement?: string;
}

/** A kept arrangement as a sheet takes it. */
export interface SheetArrangement {
  id: string;
  name: string;
  /** what it was made for: it stands on no other way's sheet */
  way: WayMoves;
  chords: readonly { written: string; shape: Shape | null }[];
  strokes: SheetStrokes;
}

/** All twelve keys, each as near as may be to the one that the sheet began with. */
export function keyChoices(written: KeyName, around: number): { shift: number; key: KeyName; label: string }[] {
  return Array.from({ length: 12 }, (_, k) => {
    const shift = around - 5 + k;
    const key = movedKey(written, shift);
    return { shift, key, label: `${glyphs(keySign(key))}, ${shortMove(shift)}` };
  });
}

/** What a sheet is made from. */
export interface SheetParts {
  song: Song;
  /** null where the song has no key */
  key: KeyName | null;
  shift: number;
  singer: string | null;
  instrument: Instrument;
  /** null while ways are searched, and where there are none */
  way: Way | null;
  /** whose shapes and strokes it shows; null for the way's own */
  arrangement: SheetArrangement | null;
  /** where it lies in the singer's voice; null where that is not known */
  tune: SheetTune | null;
}

/** Everything that stands on the paper. */
export function sheetOf({ song, key, shift, singer, instrument, way, arrangement, tune }: SheetParts): Sheet {
  const from = key && writtenKey(song);
  const first = song.tune?.kind === "melody" ? song.tune.notes[0] : undefined;
  const strings = instrument.strings.map(({ note }) => note);
  return {
    title: song.title,
    facts: factsOf(song),
    chart: song.chart,
    from,
    key,
    singer: singer !== null && /^(my|your) voice$/i.test(singer.trim()) ? null : singer,
    firstNote: first && key ? noteName(Math.round(first.midi) + shift, keyFifths(key) < 0 ? "flats" : "sharps") : null,
    instrument: way &&
      key && {
        name: instrument.name,
        strings,
        tuned: strings.map((note, index) => way.strings[index]?.to ?? note),
        fretNames: instrument.fretMap
          ? Array.from({ length: instrument.frets + 1 }, (_, fret) => fretName(instrument, fret))
          : null,
        leftHanded: instrument.leftHanded,
        retune: way.retune,
        capo: way.capo,
        shapeKey: { tonic: way.shapeKey, mode: key.mode },
      },
    chords: (way?.chords ?? []).map(({ written, sounding, played, shape }) => {
      const arranged = arrangement?.chords.find((chord) => chord.written === written);
      return { written, sounding, played, shape: arranged ? arranged.shape : shape };
    }),
    strokes: arrangement?.strokes ?? null,
    tune,
    order: partOrder(song.chart),
  };
}

/** The key that the chart is in; the tune's home note where there is no key. */
export function writtenKey({ writtenKey: key, tune }: Pick<Song, "writtenKey" | "tune">): KeyName | null {
  return key ?? (tune && { tonic: tune.home, mode: "major" });
}

/** A song's chords, the same as they are played, and its key; null where it lacks either. */
export function chordsOf(
  song: Pick<Song, "chart" | "writtenKey" | "tune">,
): { chords: string[]; sequence: string[]; from: KeyName } | null {
  const from = writtenKey(song);
  const chart = parseChart(song.chart);
  const chords = chartChords(chart);
  return from && chords.length > 0 ? { chords, sequence: playedChords(chart), from } : null;
}

function factsOf({ beatsPerBar, tempo }: Pick<Song, "beatsPerBar" | "tempo">): string {
  const beats = beatsPerBar === null ? [] : [`${beatsPerBar} ${beatsPerBar === 1 ? "beat" : "beats"} in a bar`];
  return [...beats, ...(tempo === null ? [] : [`${tempo} a minute`])].join(", ");
}

/** The song of a link, for whoever has it: it is on nobody's shelf. */
export function sharedSong({ title, chart, writtenKey: key, beatsPerBar, tempo }: SharedSheet): Song {
  return {
    id: "00000000-0000-4000-8000-000000000000",
    ...{ title, chart, writtenKey: key, beatsPerBar, tempo },
    ...{ tune: null, demo: null, tags: [], archivedAt: null, playedAt: null },
    createdAt: "2000-01-01T00:00:00.000Z",
    revision: 0,
  };
}
