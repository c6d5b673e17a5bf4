import { transposeChord } from "../../music/chord";
import { type KeyName, tonicPitchClass } from "../../music/keyName";
import { parseChart } from "../chart";
import type { MelodyNote } from "../melody";
import type {
  BackingBeat,
  BackingEvent,
  BackingPlan,
  BackingStretch,
  BackingWishes,
  ChordInTime,
  PlannedNote,
} from "./backingPlan";
import { playHand } from "./handEvents";
import { type Metre, metreOf } from "./metre";
import { phraseBreaks } from "./phraseBreaks";
import { songBars, type SongPart } from "./songBars";

/** What is known of a song. */
export interface BackingSong {
  /** chords over words */
  chart: string;
  /** the key the chart is written in; null where it is not known */
  writtenKey: KeyName | null;
  /** its tune as written, times in quarter notes; empty where it is not known */
  notes: readonly MelodyNote[];
  beatsPerBar: number | null;
  /** quarter notes a minute */
  tempo: number | null;
}

/** The key to play in. */
export interface BackingKey {
  /** ASCII: "Db" */
  tonic: string;
  /** semitones from the tune as written to this key, octaves included, as a key's score tells them */
  shift: number;
}

/** For songs that do not say how fast they go. */
export const USUAL_TEMPO = 90;
const guideLevel = 0.5;

/**
 * Plans the backing of a song in a key: what sounds when.
 *
 * @param song chart, tune, metre and tempo
 * @param key the key to play in, and how far the tune moves to it
 * @param wishes tempo, right hand, count-in, guide
 * @returns the plan; null where the song has neither chords nor words nor a tune
 * @throws RangeError if the tempo is outside 20 to 400, or the tonic is no note name
 */
export function planBacking(song: BackingSong, key: BackingKey, wishes: BackingWishes = {}): BackingPlan | null {
  const tempo = wishes.tempo ?? song.tempo ?? USUAL_TEMPO;
  if (!(tempo >= 20 && tempo <= 400)) throw new RangeError("a tempo lies between 20 and 400 quarter notes a minute");
  if (wishes.barsPerLine !== undefined && !(Number.isInteger(wishes.barsPerLine) && wishes.barsPerLine > 0)) {
    throw new RangeError("a line has a whole number of bars");
  }
  const metre = metreOf(song.beatsPerBar);
  const notes = [...song.notes].sort((a, b) => a.start - b.start);
  const all = songBars(parseChart(song.chart), notes, metre, wishes.barsPerLine ?? null);
  const parts = wishes.once ? onceThrough(all) : all;
  const bars = parts.reduce((sum, { lines }) => sum + lines.reduce((count, line) => count + line.bars.length, 0), 0);
  if (bars === 0) return null;
  const barS = (metre.quarters * 60) / tempo;
  const countInBars = wishes.countInBars ?? 1;
  const countInS = countInBars * barS;
  const durationS = (countInBars + bars) * barS;
  const seconds = (quarters: number) => (quarters * 60) / tempo;
  const chords = chordsInTime(parts, metre);
  const sung = sungNotes(parts, notes, metre);
  const semitones = song.writtenKey ? tonicPitchClass(key.tonic) - tonicPitchClass(song.writtenKey.tonic) : key.shift;
  const target = { tonic: key.tonic, mode: song.writtenKey?.mode ?? ("major" as const) };
  const beats = countedBeats(metre, tempo, countInBars, bars);
  const hand = wishes.hand ?? "strum";
  const planned = sung.notes.map(({ at, duration, midi, phrase }): PlannedNote => {
    return { at: countInS + seconds(at), duration: seconds(duration), midi: midi + key.shift, phrase };
  });
  const strokes =
    typeof hand === "function" ? hand(chords, { metre, bars }) : playHand(chords, semitones, { metre, bars, hand });
  const played = strokes.map((event) => {
    const at = countInS + seconds(event.at);
    return { ...event, at, duration: Math.min(seconds(event.duration), durationS - at) };
  });
  const events: BackingEvent[] = [
    ...clicks(beats, wishes.click ?? false, barS / metre.beats),
    ...played,
    ...(wishes.guide ? planned.map(guide) : []),
  ];
  // What begins together in the music begins together in time, whatever the last digits of a sum say.
  const place = ({ at }: BackingEvent) => Math.round((at * tempo * 1e5) / 60);
  const timed = (stretches: readonly BackingStretch[]) =>
    stretches.map(({ at, end, label }) => ({ at: countInS + seconds(at), end: countInS + seconds(end), label }));
  return {
    events: inOrder(events, place),
    beats,
    chords: chords.map(({ at, chord }) => {
      const name = chord && transposeChord(chord, semitones, target, song.writtenKey ?? undefined);
      return { at: countInS + seconds(at), name };
    }),
    parts: timed(partStretches(parts, metre)),
    phrases: timed(sung.phrases),
    notes: planned,
    metre,
    tempo,
    bars,
    countInS,
    durationS,
  };
}

/** By place in the music; those of one place get one time. */
function inOrder(events: BackingEvent[], place: (event: BackingEvent) => number): BackingEvent[] {
  const sorted = events.sort((a, b) => place(a) - place(b));
  let last = { place: -1, at: 0 };
  return sorted.map((event) => {
    const here = place(event);
    if (here !== last.place) last = { place: here, at: event.at };
    return last.at === event.at ? event : { ...event, at: last.at };
  });
}

/** Parts up to the end of the tune as it is written; without a tune the whole song. */
function onceThrough(parts: readonly SongPart[]): readonly SongPart[] {
  const lastNote = (part: SongPart) => Math.max(0, ...part.lines.map(({ tune }) => tune?.to ?? 0));
  const most = Math.max(...parts.map(lastNote));
  const end = parts.findIndex((part) => lastNote(part) === most);
  const begin = parts.findIndex(({ lines }) => lines.some(({ tune }) => tune !== null));
  return most > 0 ? parts.slice(begin, end + 1) : parts;
}

function chordsInTime(parts: readonly SongPart[], metre: Metre): ChordInTime[] {
  const chords: ChordInTime[] = [];
  let bar = 0;
  for (const { bars } of parts.flatMap(({ lines }) => lines)) {
    for (const inBar of bars) {
      for (const { at, chord } of inBar) chords.push({ at: bar * metre.quarters + at, chord });
      bar += 1;
    }
  }
  return chords.filter(({ chord }, k) => k === 0 || chord?.text !== chords[k - 1]!.chord?.text);
}

interface Sung {
  notes: { at: number; duration: number; midi: number; phrase: number }[];
  phrases: BackingStretch[];
}

/** The tune's notes wherever the song has them. A note that would outlast the song is cut. */
function sungNotes(parts: readonly SongPart[], notes: readonly MelodyNote[], metre: Metre): Sung {
  const sung: Sung = { notes: [], phrases: [] };
  const lines = parts.flatMap((part) => part.lines);
  const length = lines.reduce((sum, { bars }) => sum + bars.length, 0) * metre.quarters;
  let bar = 0;
  for (const { words, bars, tune } of lines) {
    const from = bar * metre.quarters;
    bar += bars.length;
    if (!tune) continue;
    const own = notes.slice(tune.from, tune.to);
    const begins = words === null ? phraseBreaks(own) : [0];
    begins.forEach((begin, k) => {
      const moved = own.slice(begin, begins[k + 1]).flatMap(({ start, duration, midi }) => {
        const at = from + start - tune.bar * metre.quarters;
        const fits = at >= 0 && at < length && start < (tune.bar + bars.length) * metre.quarters;
        return fits ? [{ at, duration: Math.min(duration, length - at), midi, phrase: sung.phrases.length }] : [];
      });
      const last = moved.at(-1);
      if (!last) return;
      sung.phrases.push({ at: moved[0]!.at, end: last.at + last.duration, label: words?.trim() || null });
      sung.notes.push(...moved);
    });
  }
  return sung;
}

function partStretches(parts: readonly SongPart[], metre: Metre): BackingStretch[] {
  let bar = 0;
  return parts.flatMap(({ label, lines }) => {
    const at = bar * metre.quarters;
    bar += lines.reduce((sum, { bars }) => sum + bars.length, 0);
    const end = bar * metre.quarters;
    return end > at ? [{ at, end, label }] : [];
  });
}

function countedBeats(metre: Metre, tempo: number, countInBars: number, bars: number): BackingBeat[] {
  const beatS = (metre.quarters * 60) / tempo / metre.beats;
  return Array.from({ length: (countInBars + bars) * metre.beats }, (_, k) => {
    const beat = k % metre.beats;
    return { at: k * beatS, bar: Math.floor(k / metre.beats) - countInBars, beat, strong: metre.strong.includes(beat) };
  });
}

function clicks(beats: readonly BackingBeat[], throughout: boolean, beatS: number): BackingEvent[] {
  return beats.flatMap(({ at, bar, beat, strong }): BackingEvent[] => {
    if (bar >= 0 && !throughout) return [];
    const level = beat === 0 ? 0.9 : strong ? 0.6 : 0.45;
    return [{ at, duration: Math.min(0.06, beatS), kind: "click", midis: [], level: bar < 0 ? level : level / 2 }];
  });
}

function guide({ at, duration, midi }: PlannedNote): BackingEvent {
  return { at, duration, kind: "guide", midis: [midi], level: guideLevel };
}
