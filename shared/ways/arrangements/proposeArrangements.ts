import { handPath, travelMm, type HandOption } from "../handPath";
import { allShapes } from "../neck/allShapes";
import { highestUsedFret } from "../shapeLibrary";
import { songFlow, type SongFlow } from "../songFlow";
import type { Shape } from "../way";
import {
  arrangementMark,
  type ArrangementKind,
  type ArrangementProposal,
  type ArrangementQuestion,
} from "./arrangement";
import { costOf, handMm, rootString, weighArrangement } from "./weighArrangement";

/** A shape this much harder than the plainest one of its chord is not proposed. */
const tooMuchHarder = 3.5;
/** What makes travel count alone, and shapes only between equals. */
const nearlyNothing = 1e-6;
/** "Up the neck" begins here, counted from nut or capo. */
const upTheNeck = 5;
/** More than this many are no help in choosing. */
const most = 5;
const least = 3;

interface Option extends HandOption {
  shape: Shape;
  lowest: number;
  sounding: number;
  open: number;
  root: number | null;
}

/** One shape for each chord; null where there is none. */
type Line = readonly (Option | null)[];

/**
 * Arrangements of one way: the plainest, the one with the least hand travel, the fullest, one up the neck, and others by
 * the string that carries the root.
 *
 * All choose from the same shapes within an octave of nut or capo, none of them far harder than the plainest one of its
 * chord. The plainest is never harder than another one, the closest never travels more, the fullest never sounds fewer
 * strings; where all sound alike many, one that weighs shapes and travel together stands in its place. One that is best at two things comes once. Three at least, wherever the instrument has so many.
 *
 * @param question a way's chords, their order in the song, instrument and capo
 * @returns arrangements that differ, the plainest first; none where no chord can be played
 * @throws RangeError if a string's note cannot be read
 */
export function proposeArrangements(question: ArrangementQuestion): ArrangementProposal[] {
  const { chords, sequence } = question;
  const names = chords.map(({ written }) => written);
  const flow = songFlow(names, sequence ?? names);
  const pool = chords.map(({ played }) => optionsOf(played, question));
  if (pool.every(({ length }) => length === 0)) return [];
  const found = new Map<string, ArrangementProposal>();
  const propose = (id: string, kind: ArrangementKind, line: Line) => {
    const arranged = chords.map((chord, k) => ({ ...chord, shape: line[k]?.shape ?? null }));
    const mark = arrangementMark(arranged);
    const same = found.get(mark);
    if (same) {
      if (kind !== "balanced" && kind !== "root" && kind !== "place" && kind !== "other") same.kinds.push(kind);
      return;
    }
    const weight = weighArrangement({ ...question, chords: arranged });
    found.set(mark, { id, kinds: [kind], chords: arranged, weight });
  };

  const plainest = pool.map((options) => options[0] ?? null);
  const sounding = (options: readonly Option[]) => bestOf(options, (option) => option.sounding);
  const fuller = pool.some((options, k) => plainest[k] !== null && !sounding(options).includes(plainest[k]!));
  const fullest = smoothest(fuller ? pool.map(sounding) : pool, flow);
  const highest = smoothest(
    pool.map((options) => bestOf(options, ({ open, lowest }) => (open === 0 ? Math.min(lowest, upTheNeck) : 0))),
    flow,
  );
  propose("plainest", "plainest", plainest);
  propose("closest", "closest", closestOf(pool, flow, [plainest, fullest, highest]));
  propose(fuller ? "fullest" : "balanced", fuller ? "fullest" : "balanced", fullest);
  propose("highest", "highest", highest);
  for (const string of question.instrument.strings.keys()) {
    if (found.size >= most) break;
    const onString = pool.map((options) => options.filter(({ root }) => root === string));
    if (onString.every((options, k) => options.length > 0 || pool[k]!.length === 0)) {
      propose(`root-${string + 1}`, "root", smoothest(onString, flow));
    }
  }
  for (const fret of [7, 3, 10]) {
    if (found.size >= least) break;
    const near = pool.map((options) => bestOf(options, ({ lowest }) => -Math.abs(lowest - fret)));
    propose(`place-${fret}`, "place", smoothest(near, flow));
  }
  pool.forEach((options, k) => {
    for (const other of options.slice(1)) {
      if (found.size >= least) return;
      propose(`other-${k + 1}`, "other", plainest.with(k, other));
    }
  });
  return stillClosest([...found.values()]);
}

/** The shapes of a chord that may be proposed, the plainest first. */
function optionsOf(played: string, { instrument, capo }: ArrangementQuestion): Option[] {
  const found = allShapes(played, instrument, capo, highestUsedFret);
  const easiest = found[0] ? costOf(found[0]) : 0;
  return found.flatMap((shape): Option[] => {
    const cost = costOf(shape);
    if (cost > easiest + tooMuchHarder) return [];
    const sounding = shape.frets.filter((fret): fret is number => fret !== null);
    const stopped = sounding.filter((fret) => fret > 0);
    return [
      {
        shape,
        cost,
        dislike: 0,
        handMm: handMm(shape, instrument, capo),
        lowest: stopped.length === 0 ? 0 : Math.min(...stopped),
        sounding: sounding.length,
        open: sounding.length - stopped.length,
        root: rootString(shape, instrument),
      },
    ];
  });
}

/** Those options of a chord that have most of something. */
function bestOf(options: readonly Option[], amount: (option: Option) => number): Option[] {
  const highest = Math.max(...options.map(amount));
  return options.filter((option) => amount(option) === highest);
}

/** The line through the options that costs least, shapes and travel together. */
function smoothest(pool: readonly (readonly Option[])[], flow: SongFlow): Line {
  const { taken } = handPath(
    pool.map((options) => (options.length > 0 ? options : [nothing])),
    flow,
  );
  return pool.map((options, k) => options[taken[k]!] ?? null);
}

const nothing: HandOption = { cost: 0, dislike: 0, handMm: null };

/** The line with the least travel; of such ones the plainest. */
function closestOf(pool: readonly (readonly Option[])[], flow: SongFlow, others: readonly Line[]): Line {
  const travelOnly = pool.map((options) => options.map((option) => ({ ...option, cost: option.cost * nearlyNothing })));
  const shortest = smoothest(travelOnly, flow);
  const travel = (line: Line) =>
    travelMm(
      line.map((option) => option ?? nothing),
      flow,
    );
  return others.reduce((best, line) => (travel(line) < travel(best) ? line : best), shortest);
}

/** Where an arrangement proposed for its roots travels less than all, it is the closest one. */
function stillClosest(found: readonly ArrangementProposal[]): ArrangementProposal[] {
  const shortest = Math.min(...found.map(({ weight }) => weight.travelMm));
  const named = found.find(({ kinds }) => kinds.includes("closest"));
  if (!named || named.weight.travelMm === shortest) return [...found];
  const closer = found.find(({ weight }) => weight.travelMm === shortest)!;
  return found.map((each) => {
    if (each === named)
      return { ...each, kinds: each.kinds.length > 1 ? each.kinds.filter((kind) => kind !== "closest") : ["other"] };
    return each === closer ? { ...each, kinds: ["closest", ...each.kinds] } : each;
  });
}
