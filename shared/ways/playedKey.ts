import type { Chord } from "../music/chord";
import type { Instrument } from "../instruments/instrument";
import { handPath, lineCost, travelMm, type HandOption } from "./handPath";
import { shapeMark } from "./shapeMark";
import { highestUsedFret, stockOf, type NeckStock, type ShapeStock, type StockShape } from "./shapeLibrary";
import type { SongFlow } from "./songFlow";
import type { WayPreferences } from "./way";

/** One chord with the fingering it gets in the flow of the song. */
interface PlayedChord {
  /** name of the shape that the fingers play */
  name: string;
  /** null for what is no chord ("N.C.") */
  chord: Chord | null;
  /** null where the instrument cannot play it */
  taken: StockShape | null;
  withoutBass: boolean;
  /** null where nothing is known of the player */
  known: boolean | null;
}

/** A song's chords under the fingers, in one key. */
export interface PlayedKey {
  chords: PlayedChord[];
  /** cost of the hand without wishes, on the scale of one shape's cost */
  cost: number;
  /** the same with the wishes that hang on shapes */
  total: number;
  /** strings under barres in full six-string barres, strings that do not ring open, and shapes not known: how much of each, per chord played */
  amounts: { barres: number; stopped: number; unknown: number };
  /** hand travel the song through, mm, as it is without a capo */
  travelMm: number;
}

/** What full dislike of each adds for one chord. */
const dislike = { barre: 4, stopped: 2, unknown: 3 };
const usualFamiliar = 0.5;
const fullBarre = 6;
/** A chord that cannot be played costs as much as two full barres. */
const unplayable: HandOption & { shape: null } = { cost: 8, dislike: 0, handMm: null, shape: null };
const silence: HandOption & { shape: null } = { cost: 0, dislike: 0, handMm: null, shape: null };

/** What shapes are chosen by. */
interface Playing {
  instrument: Instrument;
  capo: number;
  neck: NeckStock;
  flow: SongFlow;
  wishes: WayPreferences;
}

/**
 * Chooses the shapes of a song's chords in one key, of all that the neck has: the line that costs least, wishes included.
 *
 * @param chords names and chords as the fingers play them
 * @param playing instrument, capo, flow of the song, wishes
 * @returns the chosen shapes with their costs
 */
export function playedKey(chords: readonly { name: string; chord: Chord | null }[], playing: Playing): PlayedKey {
  const { instrument, neck, capo, flow } = playing;
  const player = knownTo(playing.wishes);
  const layers = chords.map(({ name, chord }) => {
    const stock = chord ? stockOf(chord, instrument, neck, capo) : null;
    return { stock, options: stock ? optionsOf(stock, name, player, playing) : [silence] };
  });
  const { taken, total } = handPath(
    layers.map(({ options }) => options),
    flow,
  );
  const line = taken.map((index, k) => layers[k]!.options[index]!);
  const played = chords.map(({ name, chord }, k): PlayedChord => {
    const { stock } = layers[k]!;
    const { shape } = line[k]!;
    const known = player && shape ? player.knows(shape, name, stock!) : null;
    return { name, chord, taken: shape, withoutBass: stock?.withoutBass ?? false, known };
  });
  return {
    chords: played,
    cost: lineCost(line, flow).plain,
    total,
    amounts: amountsOf(played, flow, instrument),
    travelMm: travelMm(line, flow),
  };
}

type ShapedOption = HandOption & { shape: StockShape | null };

/** The best fingering at each place of the neck: another one there can only cost more. */
function optionsOf(stock: ShapeStock, name: string, player: Player | null, playing: Playing): ShapedOption[] {
  const { capo, instrument, wishes } = playing;
  const room = instrument.frets - capo;
  const barre = (wishes.barre * dislike.barre) / fullBarre;
  const stopped = ((wishes.ringing ?? 0) * dislike.stopped) / instrument.strings.length;
  const unknown = player ? (wishes.familiar ?? usualFamiliar) * dislike.unknown : 0;
  // Of one place on the neck the cheapest stays, and those that spare the hand more though wishes speak against them.
  const places: ShapedOption[][] = Array.from({ length: highestUsedFret + 1 }, () => []);
  for (const shape of player?.byMark ? stock.every() : stock.shapes) {
    if (shape.highestFret > room) continue;
    const cost = capo > 0 ? shape.cost.underCapo : shape.cost.bare;
    const { barreStrings, openStrings, lowestFret } = shape.load;
    let disliked = barre * barreStrings + stopped * (instrument.strings.length - openStrings);
    if (unknown > 0 && !player!.knows(shape, name, stock)) disliked += unknown;
    const place = places[lowestFret]!;
    if (!isBeaten(place, cost, disliked)) keepBest(place, { cost, dislike: disliked, handMm: shape.handMm, shape });
  }
  const options = places.flat();
  return options.length > 0 ? options : [unplayable];
}

function isBeaten(place: readonly HandOption[], cost: number, disliked: number): boolean {
  for (const other of place)
    if (other.cost <= cost && weight(other.cost, other.dislike) <= weight(cost, disliked)) return true;
  return false;
}

/** Puts an option in the place of all that it beats. */
function keepBest(place: ShapedOption[], option: ShapedOption): void {
  const { cost, dislike: disliked } = option;
  let left = 0;
  for (const other of place)
    if (cost > other.cost || weight(cost, disliked) > weight(other.cost, other.dislike)) place[left++] = other;
  place[left] = option;
  place.length = left + 1;
}

/** What of a chord's share of the total hangs on it alone. */
function weight(cost: number, disliked: number): number {
  return 0.7 * cost + disliked;
}

function amountsOf(chords: readonly PlayedChord[], flow: SongFlow, instrument: Instrument): PlayedKey["amounts"] {
  const amounts = { barres: 0, stopped: 0, unknown: 0 };
  chords.forEach(({ taken, known }, k) => {
    if (!taken) return;
    const part = flow.times[k]! / flow.played;
    amounts.barres += (part * taken.load.barreStrings) / fullBarre;
    amounts.stopped += (part * (instrument.strings.length - taken.load.openStrings)) / instrument.strings.length;
    if (known === false) amounts.unknown += part;
  });
  return amounts;
}

/** What the player has said to know. */
interface Player {
  /** whether any shape at all may be known, not the usual ones alone */
  byMark: boolean;
  knows: (shape: StockShape, name: string, stock: ShapeStock) => boolean;
}

function knownTo({ knownShapes, knownMarks = [] }: WayPreferences): Player | null {
  if (knownShapes.length === 0 && knownMarks.length === 0) return null;
  const names = new Set(knownShapes);
  const marks = new Set(knownMarks);
  return {
    byMark: marks.size > 0,
    knows: (shape, name, stock) =>
      (names.has(name) && shapeMark(shape.frets) === (stock.usual && shapeMark(stock.usual.frets))) ||
      (marks.size > 0 && marks.has(shapeMark(shape.frets))),
  };
}
