import { listWords } from "@/shared/music/listWords";
import { glyphs, noteName, pitchClass, type Spelling } from "@/shared/music/pitch";
import type { KeyMark, SingingVoice } from "@/shared/keys/keyScore";

/** Steps a ladder may have, px a semitone: result, first page, card. */
export type LadderStep = 18 | 15 | 12;

/** What goes with each step: column, its end radius, place of names and rungs, height of marks, room round the column. */
export const ladderMeasures = {
  18: {
    column: 64,
    radius: 14,
    names: 26,
    rungs: 34,
    columnX: 44,
    mark: 8,
    gap: 8,
    ground: 4,
    font: 13,
    tick: 8,
    noteGap: 2.5,
    perPercent: 5.2,
  },
  15: {
    column: 52,
    radius: 14,
    names: 24,
    rungs: 32,
    columnX: 42,
    mark: 9,
    gap: 8,
    ground: 5,
    font: 13,
    tick: 8,
    noteGap: 2.5,
    perPercent: 3.7,
  },
  12: {
    column: 44,
    radius: 11,
    names: 22,
    rungs: 29,
    columnX: 38,
    mark: 8,
    gap: 6,
    ground: 3,
    font: 12,
    tick: 6,
    noteGap: 2,
    perPercent: 3.2,
  },
} as const;

const naturals = new Set([0, 2, 4, 5, 7, 9, 11]);

/** Whether a semitone has a name of its own on the ladder. */
export function isNatural(midi: number): boolean {
  return naturals.has(pitchClass(midi));
}

/** Lowest and highest semitone of a picture, whole MIDI numbers. */
export interface Scale {
  low: number;
  high: number;
}

/** Every semitone of a picture, from low to high. */
export function semitonesOf({ low, high }: Scale): number[] {
  return Array.from({ length: high - low + 1 }, (_, k) => low + k);
}

/** The semitones that a ladder must show: voice and marks with a rung of air, ending on naturals. */
export function ladderScale(voice: SingingVoice | null, marks: readonly Pick<KeyMark, "midi">[], air: number): Scale {
  const ends = [
    ...(voice ? [Math.round(voice.range.lowMidi), Math.round(voice.range.highMidi)] : []),
    ...marks.map((mark) => mark.midi),
  ];
  if (ends.length === 0) return { low: 52, high: 74 };
  let low = Math.min(...ends) - air;
  let high = Math.max(...ends) + air;
  if (!isNatural(low)) low -= 1;
  if (!isNatural(high)) high += 1;
  return { low, high };
}

/** Height of a pitch on a ladder whose top rung is `scale.high`; `pad` is the room above that rung. */
export function yOf(midi: number, scale: Scale, step: number, pad: number): number {
  return pad + (scale.high - midi) * step;
}

/** Where a pitch lies in a voice. Pitches are compared by the nearest semitone, as they are sung and drawn. */
export function zoneOf(midi: number, voice: SingingVoice): KeyMark["zone"] {
  const inside = (band: { lowMidi: number; highMidi: number }) =>
    midi >= Math.round(band.lowMidi) && midi <= Math.round(band.highMidi);
  if (inside(voice.comfort)) return "comfort";
  return inside(voice.range) ? "reach" : "beyond";
}

/** Whether a mark lies above the voice or under it. */
export function sideOf(midi: number, voice: SingingVoice): "above" | "below" {
  return midi >= (voice.range.lowMidi + voice.range.highMidi) / 2 ? "above" : "below";
}

/** Length of a mark: by its share, never shorter than it is high. `perPercent` px for each per cent of the time. */
export function markLength(share: number, perPercent: number, height: number): number {
  return Math.max(height, share * 100 * perPercent);
}

/** px for each per cent: `usual`, or less where the longest mark would not fit into `room`. */
export function lengthPerPercent(marks: readonly Pick<KeyMark, "share">[], room: number, usual: number): number {
  const longest = Math.max(0.01, ...marks.map((mark) => mark.share)) * 100;
  return Math.min(usual, room / longest);
}

/** One scale for the rows of several keys: voice and all marks, with `air` semitones for the names at both ends. */
export function commonScale(voice: SingingVoice, rows: readonly (readonly Pick<KeyMark, "midi">[])[], air = 3): Scale {
  const pitches = rows.flatMap((marks) => marks.map((mark) => mark.midi));
  return {
    low: Math.min(Math.round(voice.range.lowMidi), ...pitches) - air,
    high: Math.max(Math.round(voice.range.highMidi), ...pitches) + air,
  };
}

const say = (midi: number, spelling: Spelling) => glyphs(noteName(midi, spelling));

function percent(marks: readonly KeyMark[], zone: KeyMark["zone"]): number {
  return Math.round(100 * marks.filter((mark) => mark.zone === zone).reduce((sum, mark) => sum + mark.share, 0));
}

/** What lies beyond the range, the notes of each side together; null where nothing does. */
export function beyondWords(
  marks: readonly { midi: number; zone: KeyMark["zone"] | null }[],
  voice: SingingVoice,
  spelling: Spelling,
): string | null {
  const beyond = marks.filter(({ zone }) => zone === "beyond").sort((a, b) => a.midi - b.midi);
  const sides = (["below", "above"] as const).flatMap((side) => {
    const names = beyond.filter(({ midi }) => sideOf(midi, voice) === side).map(({ midi }) => say(midi, spelling));
    return names.length > 0 ? [`${listWords(names)} ${side} your range`] : [];
  });
  return sides.length > 0 ? `Beyond: ${sides.join("; ")}.` : null;
}

/** The whole picture in words, for those who do not see it. */
export function ladderWords(
  voice: SingingVoice | null,
  marks: readonly KeyMark[],
  spelling: Spelling = "common",
): string {
  const parts: string[] = [];
  if (voice) {
    const ends = (band: SingingVoice["range"]) => `${say(band.lowMidi, spelling)} to ${say(band.highMidi, spelling)}`;
    parts.push(
      voice.heard
        ? `Sung so far from ${ends(voice.heard)}, probably reaching from ${ends(voice.range)} (estimate).`
        : `Voice from ${ends(voice.range)}.`,
    );
    parts.push(`Comfortable from ${say(voice.comfort.lowMidi, spelling)} to ${say(voice.comfort.highMidi, spelling)}.`);
  }
  if (marks.length > 0) {
    const pitches = marks.map((mark) => mark.midi);
    parts.push(`Notes from ${say(Math.min(...pitches), spelling)} to ${say(Math.max(...pitches), spelling)}.`);
    if (voice) {
      parts.push(
        `${percent(marks, "comfort")} % of the time in comfort, ${percent(marks, "reach")} % in reach, ${percent(marks, "beyond")} % beyond.`,
        beyondWords(marks, voice, spelling) ?? "",
      );
    }
  }
  return parts.filter((part) => part !== "").join(" ");
}

/** Moves labels apart to `distance`, keeping their order and staying as near to their places as one pass allows. */
export function spread(places: readonly number[], distance: number): number[] {
  const out = [...places];
  for (let i = 1; i < out.length; i += 1) {
    const over = (out[i - 1] ?? 0) + distance - (out[i] ?? 0);
    if (over > 0) {
      out[i - 1] = (out[i - 1] ?? 0) - over / 2;
      out[i] = (out[i] ?? 0) + over / 2;
      for (let k = i - 1; k > 0 && (out[k] ?? 0) - (out[k - 1] ?? 0) < distance; k -= 1)
        out[k - 1] = (out[k] ?? 0) - distance;
    }
  }
  return out;
}
