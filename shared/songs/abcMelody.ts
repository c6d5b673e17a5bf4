import { abcTunes } from "./abcBook";
import { abcPartOrder } from "./abcSigns";
import { type AbcPart, type AbcTune, mostVoices, readAbcTune } from "./abcTune";
import { type AbcBarText, AbcTooLarge } from "./abcBars";
import type { MelodyNote } from "./melody";
import { type MelodySyllable, type WrittenFile, type WrittenVoice, laterChanges } from "./melodyVoice";
import { playingOrder } from "./repeats";
import { placeCodas } from "./scoreSigns";

const most = { characters: 500_000, tunes: 200, notes: 100_000 };
/** Fine enough for tuplets of 3, 5, 7 and 9 down to a sixty-fourth; undoes the error of adding thirds. */
const grid = 20_160;
const tooLarge: WrittenFile = {
  ok: false,
  reason: "This ABC file holds too many notes or repeats, or lengths that no song has.",
};

/**
 * Reads tunes in ABC notation: ties joined, repeats, endings and the order of parts unrolled, grace notes and ornaments
 * left out, octave clefs and transposing voices as they sound. D.C. and D.S. are followed, al fine and al coda, except where P: gives
 * the order of the parts.
 *
 * @param text the file's text; several tunes (X:) become several voices
 * @returns the voices as written, or why the text cannot be read
 * @see ABC music standard 2.1 (2011)
 */
export function readAbc(text: string): WrittenFile {
  if (!/^\s*K:/m.test(text)) return { ok: false, reason: "This is no ABC tune: its K: line is missing." };
  if (text.length > most.characters) return tooLarge;
  try {
    const book = abcTunes(text, most.tunes + 1);
    const tunes = book.slice(0, most.tunes).map(readAbcTune);
    const voices: WrittenVoice[] = [];
    let notes = 0;
    for (const tune of tunes) {
      for (const voice of playTune(tune, tunes.length > 1)) {
        notes += voice.notes.length;
        if (notes > most.notes) return tooLarge;
        voices.push(voice);
      }
    }
    if (notes === 0) return { ok: false, reason: "There are no notes in this ABC file." };
    const [first] = tunes;
    return {
      ok: true,
      title: first?.title ?? null,
      voices,
      tempo: first?.tempo ?? null,
      beatsPerBar: first?.beatsPerBar ?? null,
      cautions: [
        ...(book.length > most.tunes
          ? [`It has more than ${most.tunes} tunes; the first ${most.tunes} were read.`]
          : []),
        ...(tunes.some((tune) => tune.unread.size > 0)
          ? [`A tune has more than ${mostVoices} voices; the others were not read.`]
          : []),
        ...laterChanges(first?.changes ?? { tempo: false, metre: false }),
      ],
    };
  } catch (error) {
    if (error instanceof AbcTooLarge) return tooLarge;
    throw error;
  }
}

function playTune(tune: AbcTune, several: boolean): WrittenVoice[] {
  const parts = tune.parts.filter(({ voice }) => voice.bars.some((bar) => bar.notes.length > 0));
  const first = parts[0]?.voice.bars ?? [];
  return parts.flatMap((part, index) => {
    const { bars } = part.voice;
    // Some write repeats into the first voice only.
    const same = bars.length === first.length;
    const bare = bars.every(({ signs }) => !signs.repeatEnd && !signs.endingStart && !signs.jump) && same;
    const order = orderOf(bare ? first : same ? withJumps(bars, first) : bars, tune.order);
    const fallback = parts.length > 1 ? `Voice ${index + 1}` : (tune.title ?? "Tune");
    const own = part.name ?? fallback;
    const name = several && tune.title !== null && own !== tune.title ? `${tune.title}, ${own}` : own;
    return playVoice(part, order, name, tune);
  });
}

/** Indices of the bars in the order they are played. */
function orderOf(bars: readonly AbcBarText[], parts: string | null): number[] {
  const signs = placeCodas(withStarts(bars));
  const labels = new Set(bars.map((bar) => bar.part));
  const wanted = parts === null || labels.size < 2 ? null : abcPartOrder(parts);
  if (parts !== null && labels.size >= 2 && wanted === null) throw new AbcTooLarge();
  const sections = wanted?.filter((label) => labels.has(label)) ?? [];
  if (sections.length === 0) {
    const order = playingOrder(signs);
    if (!order) throw new AbcTooLarge();
    return order;
  }
  if (labels.has("")) sections.unshift("");
  return sections.flatMap((label) => {
    const places = bars.flatMap((bar, index) => (bar.part === label ? [index] : []));
    // The order of the parts says all: a jump would be a second one.
    const order = playingOrder(places.map((place) => withoutJump(signs[place]!)));
    if (!order) throw new AbcTooLarge();
    return order.map((place) => places[place]!);
  });
}

/** Bars with the jumps that stand in the first voice only. */
function withJumps(bars: readonly AbcBarText[], first: readonly AbcBarText[]): readonly AbcBarText[] {
  if (bars.some(({ signs }) => signs.jump)) return bars;
  return bars.map((bar, index) => {
    const { repeatStart, repeatEnd, endingStart, endingEnd, section, ...jumps } = first[index]!.signs;
    return { ...bar, signs: { ...jumps, ...bar.signs } };
  });
}

function withoutJump({ jump, ...signs }: AbcBarText["signs"]): AbcBarText["signs"] {
  return signs;
}

/** A repeat without beginning starts at the latest double bar, repeat or beginning (standard 2.1, section 4.8). */
function withStarts(bars: readonly AbcBarText[]): AbcBarText["signs"][] {
  const signs = bars.map((bar) => ({ ...bar.signs }));
  let open = false;
  let latest = 0;
  signs.forEach((sign, index) => {
    if (sign.repeatStart) [open, latest] = [true, index];
    // The second ending belongs to the passage that was open before it.
    else if (sign.section && !open && !sign.endingStart) latest = index;
    if (sign.repeatEnd) {
      if (!open && latest > 0) signs[latest]!.repeatStart = true;
      open = false;
    }
  });
  return signs;
}

function playVoice(part: AbcPart, order: readonly number[], name: string, tune: AbcTune): WrittenVoice[] {
  const { bars } = part.voice;
  const layers = new Map<number, WrittenVoice>();
  const ties = new Map<string, MelodyNote>();
  const plays = new Map<number, number>();
  const make = (layer: number): WrittenVoice => ({
    name: layer === 0 ? name : `${name}, line ${layer + 1}`,
    notes: [],
    lyrics: [],
    key: tune.key,
    signature: null,
    program: part.program,
    percussion: part.percussion,
  });
  layers.set(0, make(0));
  let begin = 0;
  let total = 0;
  for (const index of order) {
    const bar = bars[index];
    if (!bar) continue;
    const played = plays.get(index) ?? 0;
    plays.set(index, played + 1);
    total += bar.notes.length;
    if (total > most.notes || begin > 100_000) throw new AbcTooLarge();
    for (const note of bar.notes) {
      if (!layers.has(note.layer)) layers.set(note.layer, make(note.layer));
      const start = onGrid(begin + note.start);
      const duration = onGrid(begin + note.start + note.duration) - start;
      if (duration <= 0) continue;
      const pitch = `${note.layer}/${note.midi}`;
      const tied = ties.get(pitch);
      ties.delete(pitch);
      if (tied && Math.abs(tied.start + tied.duration - start) < 1e-6) {
        tied.duration = start + duration - tied.start;
        if (note.tied) ties.set(pitch, tied);
        continue;
      }
      const sung = { start, duration, midi: note.midi };
      layers.get(note.layer)!.notes.push(sung);
      if (note.tied) ties.set(pitch, sung);
    }
    layers.get(0)!.lyrics.push(...syllablesOf(bar, played, begin));
    begin += bar.length;
  }
  return [...layers.values()].filter((voice) => voice.notes.length > 0);
}

/** Each time a bar is played, its next verse is sung. */
function syllablesOf(bar: AbcBarText, played: number, begin: number): MelodySyllable[] {
  return bar.words.flatMap(({ start, verses }) => {
    const syllable = played < verses.length ? verses[played] : verses[0];
    if (!syllable || syllable.text === "") return [];
    return [
      { start: onGrid(begin + start), text: syllable.text, ...(syllable.newLine ? { newLine: true as const } : {}) },
    ];
  });
}

function onGrid(quarters: number): number {
  return Math.round(quarters * grid) / grid;
}
