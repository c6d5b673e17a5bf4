import { diatonicFrets } from "@/shared/instruments/frets";
import type { Instrument, InstrumentString } from "@/shared/instruments/instrument";
import { readGauge, readLength } from "@/shared/instruments/units";
import { parseNoteName, plainAccidentals } from "@/shared/music/pitch";
import type { InstrumentDraft, StringDraft } from "./instrumentDraft";

/** What is wrong, by field: "name", "scale", "strings", "string 2 note". */
export type DraftErrors = Readonly<Record<string, string>>;

type Unnamed = Omit<Instrument, "id">;

const lengths = { leastMm: 100, mostMm: 2000 };
const thickestIn = 0.3;
const mostFrets = 36;

/** A note as it was typed, in ASCII with its letter in capitals; null where it is none that a string has. */
export function readNote(text: string): string | null {
  const midi = parseNoteName(text);
  if (midi === null || midi < 12 || midi > 108) return null;
  const plain = plainAccidentals(text.trim());
  const note = plain.charAt(0).toUpperCase() + plain.slice(1);
  return /^[A-G](#|b)?-?\d$/.test(note) ? note : null;
}

/** The instrument that a draft describes, or every field that does not fit, in words. */
export function readDraft(draft: InstrumentDraft): { instrument: Unnamed } | { errors: DraftErrors } {
  const errors: Record<string, string> = {};
  const name = draft.name.trim();
  if (name === "") errors.name = "Give the instrument a name.";
  else if (name.length > 80) errors.name = "A name has 80 letters at most.";
  const scaleMm = lengthOf(draft.scale, draft, "scale", errors);
  const fretMap = readFretMap(draft, errors);
  const frets = draft.fretKind === "custom" ? (fretMap?.length ?? 0) : wholeOf(draft.frets, 1, mostFrets);
  if (frets === null) errors.frets = `A whole number from 1 to ${mostFrets}.`;
  const capoTo = wholeOf(draft.capoTo, 0, 24);
  if (capoTo === null) errors.capoTo = "A whole number from 0 (no capo) to 24.";
  else if (frets !== null && frets > 0 && capoTo >= frets) errors.capoTo = "A capo needs frets left above it.";
  if (draft.strings.length === 0) errors.strings = "An instrument has at least one string.";
  const strings = draft.strings.map((string, k) => readString(string, k, draft, frets, errors));
  if (Object.keys(errors).length > 0 || scaleMm === null || frets === null || capoTo === null) return { errors };
  const { leftHanded } = draft;
  return { instrument: { name, strings, scaleMm, frets, ...(fretMap && { fretMap }), capoTo, leftHanded } };
}

/** The draft's fret map; null where its frets are chromatic or cannot be read. */
function readFretMap({ fretKind, frets, fretMap }: InstrumentDraft, errors: Record<string, string>): number[] | null {
  if (fretKind === "chromatic") return null;
  if (fretKind !== "custom") {
    const count = wholeOf(frets, 1, mostFrets);
    return count === null ? null : diatonicFrets(count, fretKind === "diatonic-half");
  }
  const map = fretMap
    .split(/[\s,;]+/)
    .filter(Boolean)
    .map(Number);
  const rises = map.every((semitones, k) => Number.isInteger(semitones) && semitones > (map[k - 1] ?? 0));
  if (map.length > 0 && map.length <= mostFrets && rises && map.at(-1)! <= 60) return map;
  errors.fretMap = "Name the semitones of each fret above the open string, rising, such as 2 4 5 7 9 10 12.";
  return null;
}

function readString(
  draft: StringDraft,
  k: number,
  { units, scale }: InstrumentDraft,
  frets: number | null,
  errors: Record<string, string>,
): InstrumentString {
  const at = `string ${k + 1}`;
  const note = readNote(draft.note);
  if (note === null) errors[`${at} note`] = "Name the note with its octave, such as G3 or F♯4.";
  const gaugeIn = draft.gauge.trim() === "" ? null : readGauge(draft.gauge, units);
  if (draft.gauge.trim() !== "" && (gaugeIn === null || gaugeIn <= 0 || gaugeIn > thickestIn))
    errors[`${at} gauge`] = `A thickness such as ${units === "metric" ? "0.41" : ".016"}; leave it empty if unknown.`;
  const madeFor = draft.madeFor.trim() === "" ? null : readNote(draft.madeFor);
  if (draft.madeFor.trim() !== "" && madeFor === null)
    errors[`${at} madeFor`] = "Name the note with its octave, such as E2; leave it empty if it is the one above.";
  const string: InstrumentString = { note: note ?? "C4", gaugeIn, material: draft.material };
  if (madeFor !== null && madeFor !== note) string.madeFor = madeFor;
  if (draft.inCourse !== "1") string.inCourse = Number(draft.inCourse);
  if (!draft.short) return string;
  const length = lengthOf(draft.length, { units, scale }, `${at} length`, errors);
  const startsAt = wholeOf(draft.startsAt, 1, 12);
  if (startsAt === null || (frets !== null && frets > 0 && startsAt > frets))
    errors[`${at} startsAt`] = "The fret beside which its nut stands, 1 to 12.";
  if (length !== null && length > (readLength(scale, units) ?? Infinity))
    errors[`${at} length`] = "A short string is no longer than the others.";
  if (length !== null) string.scaleMm = length;
  if (startsAt !== null) string.startsAtFret = startsAt;
  return string;
}

function lengthOf(
  text: string,
  { units }: Pick<InstrumentDraft, "units" | "scale">,
  field: string,
  errors: Record<string, string>,
): number | null {
  const mm = readLength(text, units);
  if (mm !== null && mm >= lengths.leastMm && mm <= lengths.mostMm) return mm;
  errors[field] =
    units === "metric" ? "Millimetres from 100 to 2000, such as 635." : "Inches from 4 to 78, such as 25.5.";
  return null;
}

function wholeOf(text: string, least: number, most: number): number | null {
  const value = Number(text.trim() || NaN);
  return Number.isInteger(value) && value >= least && value <= most ? value : null;
}

/** What can be drawn and heard of a draft that is not finished: strings without a note are left out. */
export function sketchOf(draft: InstrumentDraft): Unnamed | null {
  const strings = draft.strings.filter(({ note }) => readNote(note) !== null);
  if (strings.length === 0) return null;
  const usable = strings.map((string) => {
    const alone = readDraft({ ...draft, name: "x", capoTo: "0", strings: [string] });
    return "errors" in alone ? { ...string, gauge: "", madeFor: "", short: false } : string;
  });
  const read = readDraft({
    ...draft,
    name: draft.name.trim().slice(0, 80) || "New instrument",
    capoTo: "0",
    strings: usable,
  });
  return "instrument" in read ? read.instrument : null;
}
