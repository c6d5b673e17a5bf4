import type { Song } from "@/shared/contract/song";
import type { KeyName } from "@/shared/music/keyName";
import { glyphs } from "@/shared/music/pitch";
import { parseChart, printChart, transposeChart } from "@/shared/songs/chart";
import { sketchIntoChart, type FormPart } from "@/shared/songs/formSketch";
import { moveTune } from "@/shared/songs/noteEdits";
import type { Reconciliation } from "@/shared/songs/reconcileKeys";

/** A changed song and what to say of the change. */
export interface ChartChange {
  song: Song;
  /** one sentence, with glyphs */
  said: string;
}

/** The chart in the recording's key; the tune goes along by the smaller way, so that both still sound together. */
export function takeTransposed(song: Song, to: KeyName, nearest: number): ChartChange {
  const from = song.writtenKey;
  if (!from) throw new RangeError("a chart without a key cannot be moved");
  const chart = printChart(transposeChart(parseChart(song.chart), from, to));
  return {
    song: { ...song, chart, writtenKey: to, tune: movedTune(song.tune, nearest, to.tonic) },
    said: `The chart now stands in ${glyphs(to.tonic)}${song.tune ? ", and the tune went with it" : ""}.`,
  };
}

function movedTune(tune: Song["tune"], by: number, home: string): Song["tune"] {
  if (!tune) return null;
  if (tune.kind === "melody") {
    const notes = moveTune(tune.notes, by) ?? moveTune(tune.notes, by < 0 ? by + 12 : by - 12) ?? tune.notes;
    return { ...tune, notes, home };
  }
  const fits = tune.lowMidi + by >= 0 && tune.highMidi + by <= 127;
  const move = fits ? by : by < 0 ? by + 12 : by - 12;
  return { ...tune, lowMidi: tune.lowMidi + move, highMidi: tune.highMidi + move, home };
}

const capoNote = /^Capo \d+, as on the recording: .*$/;

/** A line of words at the head of the chart; the chords stay. A second one takes the place of the first. */
export function noteCapo(song: Song, { capo, recording, chart }: Reconciliation): ChartChange {
  if (capo === null) throw new RangeError("there is no capo to note");
  const note = `Capo ${capo}, as on the recording: shapes of ${chart.tonic}, sounds in ${recording.tonic}`;
  const rest = song.chart.split("\n").filter((line) => !capoNote.test(line));
  return {
    song: { ...song, chart: [note, ...rest].join("\n") },
    said: `Capo ${capo} stands at the head of the chart. Its chords are as they were.`,
  };
}

/** Makes room for another chart; the tune, and what the song was before, are kept. */
export function clearChart(song: Song): ChartChange {
  return {
    song: { ...song, chart: "" },
    said: "The chart is cleared for another one. The one before stays in the song's earlier versions.",
  };
}

const howWords = {
  skeleton: "The chart was empty; its parts now stand there as headings, ready for chords and words.",
  headed: "The parts are now the headings of your chart.",
  noted: "Your chart keeps its own parts; the form you heard stands as a note at its head.",
} as const;

/** The form as the chart's parts, with the tempo that was tapped. */
export function takeForm(
  song: Song,
  parts: readonly FormPart[],
  beat: { tempo: number; beatsPerBar: number } | null,
): ChartChange {
  const { text, how } = sketchIntoChart(song.chart, parts);
  return {
    song: { ...song, chart: text, ...beat },
    said: `${howWords[how]}${beat ? ` The tempo is ${beat.tempo} beats a minute.` : ""}`,
  };
}
