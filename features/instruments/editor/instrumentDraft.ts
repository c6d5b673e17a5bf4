import type { OwnInstrument } from "@/shared/contract/instrument";
import { diatonicFrets } from "@/shared/instruments/frets";
import type { Instrument, InstrumentString, StringMaterial } from "@/shared/instruments/instrument";
import { gaugeNumber, lengthNumber, readGauge, readLength, type Units } from "@/shared/instruments/units";
import { glyphs } from "@/shared/music/pitch";

/** One string as it is being typed. Lengths are in the draft's units. */
export interface StringDraft {
  /** tells strings apart while they change places */
  key: number;
  note: string;
  gauge: string;
  material: StringMaterial;
  /** empty: for the note it is kept at */
  madeFor: string;
  inCourse: "1" | "2" | "3";
  /** a short drone, with a length and a fret of its own */
  short: boolean;
  length: string;
  startsAt: string;
}

type FretKind = "chromatic" | "diatonic" | "diatonic-half" | "custom";

/** An instrument as it is being typed. */
export interface InstrumentDraft {
  units: Units;
  name: string;
  strings: StringDraft[];
  scale: string;
  frets: string;
  fretKind: FretKind;
  /** semitones of every fret, for a custom fretboard */
  fretMap: string;
  capoTo: string;
  leftHanded: boolean;
  photo: string | null;
}

export const mostStrings = 12;

/** A string that is added: like the last one in kind, with nothing known of it. */
export function newString(strings: readonly StringDraft[]): StringDraft {
  const last = strings.at(-1);
  const key = Math.max(0, ...strings.map((string) => string.key)) + 1;
  const material = last?.material ?? "unknown";
  const empty = { note: "", gauge: "", madeFor: "", inCourse: "1", short: false, length: "", startsAt: "" } as const;
  return { key, material, ...empty };
}

/** Nothing yet: three strings to fill in on a usual scale. */
export function emptyDraft(units: Units): InstrumentDraft {
  const strings: StringDraft[] = [];
  for (let k = 0; k < 3; k++) strings.push(newString(strings));
  const scale = lengthNumber(635, units);
  const rest = {
    frets: "20",
    fretKind: "chromatic",
    fretMap: "",
    capoTo: "9",
    leftHanded: false,
    photo: null,
  } as const;
  return { units, name: "", strings, scale, ...rest };
}

/** A draft of an instrument that is there. */
export function draftOf(instrument: Instrument, photo: string | null, units: Units): InstrumentDraft {
  const { name, strings, scaleMm, frets, fretMap, capoTo, leftHanded } = instrument;
  return {
    units,
    name,
    strings: strings.map((string, key) => stringDraft(string, key, scaleMm, units)),
    scale: lengthNumber(scaleMm, units),
    frets: String(frets),
    fretKind: kindOf(fretMap),
    fretMap: fretMap?.join(" ") ?? "",
    capoTo: String(capoTo),
    leftHanded,
    photo,
  };
}

function stringDraft(string: InstrumentString, key: number, scaleMm: number, units: Units): StringDraft {
  const short = string.startsAtFret !== undefined || string.scaleMm !== undefined;
  return {
    key,
    note: glyphs(string.note),
    gauge: string.gaugeIn === null ? "" : gaugeNumber(string.gaugeIn, units),
    material: string.material,
    madeFor: string.madeFor === undefined ? "" : glyphs(string.madeFor),
    inCourse: string.inCourse === 2 ? "2" : string.inCourse === 3 ? "3" : "1",
    short,
    length: short ? lengthNumber(string.scaleMm ?? scaleMm, units) : "",
    startsAt: string.startsAtFret === undefined ? "" : String(string.startsAtFret),
  };
}

function kindOf(fretMap: readonly number[] | undefined): FretKind {
  if (!fretMap) return "chromatic";
  const same = (other: readonly number[]) => other.join() === fretMap.join();
  if (same(diatonicFrets(fretMap.length, true))) return "diatonic-half";
  return same(diatonicFrets(fretMap.length, false)) ? "diatonic" : "custom";
}

/** The same draft with its lengths in other units; what cannot be read stays as it was typed. */
export function inUnits(draft: InstrumentDraft, units: Units): InstrumentDraft {
  if (draft.units === units) return draft;
  const length = (text: string) => {
    const mm = readLength(text, draft.units);
    return mm === null ? text : lengthNumber(mm, units);
  };
  const gauge = (text: string) => {
    const inches = readGauge(text, draft.units);
    return inches === null ? text : gaugeNumber(inches, units);
  };
  const strings = draft.strings.map((string) => {
    return { ...string, gauge: gauge(string.gauge), length: length(string.length) };
  });
  return { ...draft, units, strings, scale: length(draft.scale) };
}

/** Whether an edit makes another instrument of it, so that it stands for its preset no longer. */
export function isOther(before: OwnInstrument, after: Omit<OwnInstrument, "presetId">): boolean {
  const built = ({ strings, scaleMm, frets, fretMap }: Omit<OwnInstrument, "presetId">) =>
    JSON.stringify([
      strings.map(({ note, gaugeIn, material, madeFor, scaleMm: own, startsAtFret, inCourse }) => {
        return [note, gaugeIn, material, madeFor, own, startsAtFret, inCourse];
      }),
      scaleMm,
      frets,
      fretMap,
    ]);
  return built(before) !== built(after);
}
