import { sungIn, type SungSpan } from "@/features/span/sungSpan";
import type { RosterRow } from "@/shared/contract/studio/roster";
import type { Studio } from "@/shared/contract/studio/studio";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { glyphs, noteName } from "@/shared/music/pitch";
import { effortWords } from "@/shared/voice/effortWords";
import { dayInWords, daysUntil, distanceInDays } from "../dayWords";
import { capitalized, countWord, plural } from "@/shared/music/countWords";

/** The largest class that a title says in a word. */
const inAWord = 20;

/** "Fourteen voices" */
export function voicesTitle(pupils: number): string {
  if (pupils === 0) return "No pupils yet";
  return `${capitalized(countWord(pupils, inAWord))} ${pupils === 1 ? "voice" : "voices"}`;
}

/** "Concert in 16 days, Thu 10 December · 3 takes wait for your ear" */
export function studioFacts({ event, counts }: Pick<Studio, "event" | "counts">, now: Date): string {
  const evening = event && `${event.name} ${distanceInDays(daysUntil(event.date, now))}, ${dayInWords(event.date)}`;
  const waiting = counts?.waiting ?? 0;
  const takes =
    waiting === 0 ? "no takes wait" : `${plural(waiting, "take")} ${waiting === 1 ? "waits" : "wait"} for your ear`;
  const words = [evening, takes].filter(Boolean).join(" · ");
  return capitalized(words);
}

/** A pupil's voice on whole semitones, for pictures. */
export function pictureVoice({ voice }: Pick<RosterRow, "voice">): SingingVoice | null {
  if (!voice) return null;
  const whole = ({ lowMidi, highMidi }: SingingVoice["range"]) => ({
    lowMidi: Math.round(lowMidi),
    highMidi: Math.round(highMidi),
  });
  return { range: whole(voice.range), comfort: whole(voice.comfort) };
}

/** Where the newest open song lies in the pupil's voice. */
export function assignedSpan({ open, voice }: Pick<RosterRow, "open" | "voice">): SungSpan | null {
  const picture = pictureVoice({ voice });
  const [newest] = open;
  if (!picture || !newest || newest.lowMidi === null || newest.highMidi === null) return null;
  return sungIn(Math.round(newest.lowMidi), Math.round(newest.highMidi), picture);
}

const name = (midi: number) => glyphs(noteName(Math.round(midi)));

/** A pupil's band in words, with the song in it. */
export function bandWords(row: Pick<RosterRow, "name" | "voice" | "open">): string {
  const { voice, open } = row;
  if (!voice) return `${row.name}: no voice yet`;
  const ends = ({ lowMidi, highMidi }: SingingVoice["range"]) => `${name(lowMidi)} to ${name(highMidi)}`;
  const voiced = `${row.name}: reaches ${ends(voice.range)}, comfortable ${ends(voice.comfort)}`;
  const span = assignedSpan(row);
  if (!span) return voiced;
  const where = span.above ? ", goes above the range" : span.below ? ", goes below the range" : "";
  return `${voiced}. ${open[0]!.title} from ${name(span.low)} to ${name(span.high)}${where}`;
}

/** How the last take felt, in words; "" where nobody said. */
export function effortWord(effort: number | null): string {
  return effort === null ? "" : (effortWords[effort - 1] ?? "");
}

/** What there is to see of somebody who does not share: why. Null where they do. */
export function silence({ consent }: Pick<RosterRow, "consent">): string | null {
  if (consent.shares) return null;
  if (consent.waitsForGuardian) return "waits for the guardian’s word";
  return consent.withdrawnAt === null ? "has not agreed yet" : "has taken the agreement back";
}

/** Strings from low to high as players say them: "A-D-F♯". */
export function tuningWords({ strings }: NonNullable<RosterRow["instrument"]>): string {
  return strings.map(({ note }) => glyphs(note.replace(/-?\d+$/, ""))).join("-");
}
