import { listWords } from "@/shared/music/listWords";
import { glyphs, noteName, pitchClass, type Spelling } from "@/shared/music/pitch";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { tonicPitchClass } from "@/shared/music/keyName";
import type { MelodyNote } from "@/shared/songs/melody";
import { tessitura, tessituragram, type Tessitura } from "@/shared/songs/tessituragram";
import { beyondWords, zoneOf } from "./ladderGeometry";

/** A note held as long as this many quarter notes is one to camp on. */
const heldFrom = 3;

/** One bar: a semitone, its share of the time, and where it lies. */
export interface TessituraBar {
  midi: number;
  share: number;
  /** null while no voice is known */
  zone: "comfort" | "reach" | "beyond" | null;
  home: boolean;
  /** the longest single note on it, in quarter notes, where one is held */
  heldBeats: number | null;
}

/** Where a tune lives. */
export interface TunePlace {
  bars: TessituraBar[];
  figures: Tessitura;
}

/** The bars and figures of a tune; null where it has no notes. */
export function tunePlace(notes: readonly MelodyNote[], home: string, voice: SingingVoice | null): TunePlace | null {
  const figures = tessitura(notes);
  if (!figures) return null;
  const homeClass = tonicPitchClass(home);
  const bars = tessituragram(notes).map(({ midi, share }) => {
    const longest = Math.max(...notes.filter((note) => Math.round(note.midi) === midi).map(({ duration }) => duration));
    return {
      midi,
      share,
      zone: voice && zoneOf(midi, voice),
      home: pitchClass(midi) === homeClass,
      heldBeats: longest >= heldFrom ? longest : null,
    };
  });
  return { bars, figures };
}

const percent = (share: number) => `${Math.max(1, Math.round(100 * share))} %`;

/** The picture in words: ends, middle, quarters, held notes, and what lies where in the voice. */
export function tessituragramWords(
  { bars, figures }: TunePlace,
  voice: SingingVoice | null,
  spelling: Spelling = "common",
): string[] {
  const say = (midi: number) => glyphs(noteName(midi, spelling));
  const { lowMidi, highMidi, mean, q1, median, q3 } = figures;
  // The mean is seldom a note of the scale, so a key with sharps has no say in its name.
  const centre = glyphs(noteName(mean, spelling === "sharps" ? "common" : spelling));
  const words = [
    `The tune runs from ${say(lowMidi)} to ${say(highMidi)}.`,
    q1 === q3
      ? `Half of its time or more is spent on ${say(median)}; the mean is near ${centre}.`
      : `Half of its time lies between ${say(q1)} and ${say(q3)}, the middle at ${say(median)}; the mean is near ${centre}.`,
  ];
  const held = bars.filter(({ heldBeats }) => heldBeats !== null);
  if (held.length > 0)
    words.push(
      `Held long: ${held.map(({ midi, heldBeats }) => `${say(midi)} for ${tidy(heldBeats ?? 0)} beats`).join(", ")}.`,
    );
  if (!voice) return words;
  const share = (zone: TessituraBar["zone"]) =>
    bars.filter((bar) => bar.zone === zone).reduce((sum, bar) => sum + bar.share, 0);
  const parts = (["comfort", "reach", "beyond"] as const).flatMap((zone) =>
    share(zone) > 0 ? [`${percent(share(zone))} ${zoneWords[zone]}`] : [],
  );
  words.push(`Of the time ${parts.join(", ")}.`);
  const { heard } = voice;
  const guessed = heard
    ? bars.filter(({ midi, zone }) => zone === "reach" && (midi < heard.lowMidi || midi > heard.highMidi))
    : [];
  if (heard && guessed.length > 0) {
    // The voice's own ends have one name wherever they are told, whatever the key.
    const plain = (midi: number) => glyphs(noteName(midi));
    const notes = `${listWords(guessed.map(({ midi }) => say(midi)))} ${guessed.length === 1 ? "is" : "are"}`;
    words.push(
      `You have sung ${plain(heard.lowMidi)} to ${plain(heard.highMidi)} so far; ${notes} probably within reach (estimate).`,
    );
  }
  const beyond = beyondWords(bars, voice, spelling);
  return beyond ? [...words, beyond] : words;
}

const zoneWords = { comfort: "in comfort", reach: "in reach", beyond: "beyond your range" } as const;

/** Every bar as words, low to high: "D4 12 %, E4 8 %". */
export function barWords({ bars }: TunePlace, spelling: Spelling = "common"): string {
  return bars.map(({ midi, share }) => `${glyphs(noteName(midi, spelling))} ${percent(share)}`).join(", ");
}

function tidy(beats: number): string {
  return String(Math.round(beats * 10) / 10);
}
