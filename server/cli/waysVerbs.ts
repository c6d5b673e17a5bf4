import { basename } from "node:path";
import type { Instrument, InstrumentString, StringMaterial } from "../../shared/instruments/instrument";
import { findPreset, presets } from "../../shared/instruments/presets";
import { isWound, tensionChanges } from "../../shared/instruments/tension";
import { parseChord } from "../../shared/music/chord";
import type { KeyName } from "../../shared/music/keyName";
import { parseNoteName, plainAccidentals } from "../../shared/music/pitch";
import { chartChords, parseChart } from "../../shared/songs/chart";
import { findKey } from "../../shared/songs/findKey";
import { playedChords } from "../../shared/songs/playedChords";
import { findShapes } from "../../shared/ways/findShapes";
import { findWays } from "../../shared/ways/findWays";
import { readInput, songSize } from "./inputFile";
import { BadInput, type Verb } from "./verb";
import { readKey, readOptions, readWhole, required } from "./verbOptions";

/** Scale of a six-string guitar, 25.5 in, where none is given. */
const usualScaleMm = 647.7;
const usualFrets = 20;
/** Steel strings thicker than this are wound in ordinary sets. */
const thickestPlainIn = 0.02;
const mostStrings = 12;

export const shapesVerb: Verb = {
  usage: `shapes CHORD --tuning A3,D4,F#4 [--scale MM] [--frets N] [--all]\nDefaults: scale ${usualScaleMm} mm, ${usualFrets} frets.`,
  async run(args) {
    const { values, flags, rest } = readOptions(args, ["tuning", "scale", "frets"], ["all"]);
    const [text, extra] = rest;
    if (text === undefined || extra !== undefined)
      throw new BadInput("shapes wants one chord, such as shapes Am7 --tuning A3,D4,F#4.");
    const chord = parseChord(text);
    if (!chord) throw new BadInput(`"${text}" cannot be read as a chord.`);
    const scaleMm = values.scale === undefined ? usualScaleMm : readScale(values.scale);
    const frets = values.frets === undefined ? usualFrets : readWhole(values.frets, "frets", 0, 36);
    const strings = readTuning(required(values.tuning, "tuning"));
    const instrument: Instrument = {
      id: "tuning",
      name: "Tuning",
      strings,
      scaleMm,
      frets,
      capoTo: 0,
      leftHanded: false,
    };
    const shapes = findShapes(chord, instrument, { all: flags.has("all") });
    return shapes.map(({ frets: stops, fingers, barre, reachMm, ease }) => ({
      frets: stops,
      fingers,
      barre,
      reachMm,
      ease: thousandths(ease),
    }));
  },
};

export const waysVerb: Verb = {
  usage:
    "ways FILE --to KEY --instrument ID [--from KEY]\nFILE is a chart of chords over lyrics; ids: see instruments.",
  async run(args) {
    const { values, rest } = readOptions(args, ["to", "instrument", "from"]);
    const [path, extra] = rest;
    if (path === undefined || extra !== undefined) throw new BadInput("ways wants one chart file.");
    const instrument = readInstrument(required(values.instrument, "instrument"));
    const chart = parseChart(new TextDecoder().decode(await readInput(path, songSize)));
    const chords = chartChords(chart);
    if (chords.length === 0) throw new BadInput(`${basename(path)} holds no chords.`);
    const from = values.from === undefined ? findKey({ chart })?.key : readKey(values.from, "from");
    if (!from) throw new BadInput(`The key of ${basename(path)} cannot be found; add --from.`);
    const to = readTarget(required(values.to, "to"), from);
    return findWays({ chords, sequence: playedChords(chart), from, to, instrument }).map((way) => ({
      retune: way.retune,
      capo: way.capo,
      shapeKey: way.shapeKey,
      soundingKey: way.soundingKey,
      chords: way.chords.map(({ written, played, shape }) => ({ written, played, frets: shape ? shape.frets : null })),
      difficulty: thousandths(way.difficulty),
      cautions: way.cautions,
      why: way.why,
    }));
  },
};

export const instrumentsVerb: Verb = {
  usage: "instruments",
  async run(args) {
    if (args.length > 0) throw new BadInput("instruments takes no arguments.");
    return presets.map(({ id, name, strings, scaleMm, frets }) => {
      return { id, name, strings: strings.map(({ note }) => note), scaleMm, frets };
    });
  },
};

export const tensionVerb: Verb = {
  usage:
    "tension --instrument ID --shift N [--gauges .053,.042,…]\n" +
    "Gauges in inches, low to high; steel up to .020 counts as plain, thicker as wound.",
  async run(args) {
    const { values, rest } = readOptions(args, ["instrument", "shift", "gauges"]);
    if (rest.length > 0) throw new BadInput(`tension takes no argument "${rest[0]}".`);
    const preset = readInstrument(required(values.instrument, "instrument"));
    const shift = readWhole(required(values.shift, "shift"), "shift", -12, 12);
    const instrument = values.gauges === undefined ? preset : withGauges(preset, values.gauges);
    return tensionChanges(instrument, shift).map(({ string, gaugeIn, beforeLb, afterLb, verdict }) => {
      return { string, gauge: gaugeIn, beforeLb: hundredths(beforeLb), afterLb: hundredths(afterLb), verdict };
    });
  },
};

function readInstrument(id: string): Instrument {
  const instrument = findPreset(id);
  if (!instrument)
    throw new BadInput(`There is no instrument "${id}". Known: ${presets.map((preset) => preset.id).join(", ")}.`);
  return instrument;
}

/** A target without a mode word keeps the mode of the chart: from Am "to C" means C minor. */
function readTarget(text: string, from: KeyName): KeyName {
  const key = readKey(text, "to");
  return /^[A-G][#b♯♭]?$/.test(text.trim()) ? { tonic: key.tonic, mode: from.mode } : key;
}

function readTuning(text: string): InstrumentString[] {
  const names = text.split(",").map((name) => plainAccidentals(name.trim()));
  if (names.length > mostStrings) throw new BadInput(`--tuning takes up to ${mostStrings} strings.`);
  return names.map((name) => {
    const midi = parseNoteName(name);
    if (midi === null || midi < 0 || midi > 127)
      throw new BadInput(`--tuning wants notes such as A3,D4,F#4; "${name}" is none.`);
    return { note: name, gaugeIn: null, material: "unknown" };
  });
}

function readScale(text: string): number {
  const scale = Number(text);
  if (!(scale >= 100 && scale <= 2000))
    throw new BadInput(`--scale wants millimetres from 100 to 2000, not "${text}".`);
  return scale;
}

function withGauges(instrument: Instrument, text: string): Instrument {
  const gauges = text.split(",").map((part) => Number(part.trim() || NaN));
  if (gauges.some((gauge) => !(gauge > 0 && gauge <= 0.3)))
    throw new BadInput("--gauges wants inches such as .053,.042,.032.");
  if (gauges.length !== instrument.strings.length)
    throw new BadInput(`--gauges wants ${instrument.strings.length} values, low to high; there are ${gauges.length}.`);
  const wound = instrument.strings.find(({ material }) => isWound(material))?.material ?? "phosphor-bronze";
  const steel = instrument.strings.some(({ material }) => material === "plain-steel" || isWound(material));
  const strings = instrument.strings.map((string, k) => {
    return { ...string, gaugeIn: gauges[k]!, material: materialOf(string, gauges[k]!, wound, steel) };
  });
  return { ...instrument, strings };
}

/** A string of unknown material among steel ones is taken to be steel. */
function materialOf(
  string: InstrumentString,
  gaugeIn: number,
  wound: StringMaterial,
  amongSteel: boolean,
): StringMaterial {
  const steel =
    string.material === "plain-steel" || isWound(string.material) || (string.material === "unknown" && amongSteel);
  if (!steel) return string.material;
  return gaugeIn <= thickestPlainIn ? "plain-steel" : isWound(string.material) ? string.material : wound;
}

function hundredths(value: number | null): number | null {
  return value === null ? null : Math.round(value * 100) / 100;
}

function thousandths(value: number): number {
  return Math.round(value * 1000) / 1000;
}
