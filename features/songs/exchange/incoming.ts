import type { ExportedSong } from "@/shared/contract/songExport";
import { abcTunes } from "@/shared/songs/abcBook";
import { parseChart } from "@/shared/songs/chart";
import { findKey } from "@/shared/songs/findKey";
import { lyricLines } from "@/shared/songs/lyricLines";
import { readSongText, titleOfFile } from "@/shared/songs/songExport";
import { decodeText } from "@/shared/songs/textBytes";
import { readSongFile } from "../files/readSongFile";
import { readSongsFile } from "./songsFile";

/** A song that a file holds, or why it gives none. `title` is null where only the file has a name. */
export type Incoming =
  { ok: true; song: ExportedSong; cautions?: readonly string[] } | { ok: false; title: string | null; reason: string };

const largestText = 20_000_000;
const mostTunes = 500;
const longestChart = 100_000;
const melodies = /\.(?:mid|midi|kar|musicxml|xml|mxl)$/i;
const texts = /\.(?:txt|text|md)$|^[^.]+$/i;

/** What the file chooser offers. */
export const importable = ".txt,.text,.md,.abc,.mid,.midi,.kar,.musicxml,.xml,.mxl,.json";

/** Reads all songs of one file. Nothing is kept yet. Rejects with the signal's reason when it is ended. */
export async function readIncoming(file: File, signal: AbortSignal, now: Date): Promise<Incoming[]> {
  signal.throwIfAborted();
  const no = (reason: string): Incoming[] => [{ ok: false, title: null, reason }];
  if (file.size === 0) return no("This file is empty.");
  if (melodies.test(file.name)) return [await readTune(file, signal, now)];
  if (file.size > largestText) return no("This file is larger than 20 MB, more than songs need.");
  const kind = /\.(json|abc)$/i.exec(file.name)?.[1]?.toLowerCase() ?? (texts.test(file.name) ? "text" : null);
  if (kind === null)
    return no("This kind of file is not known. Texts, ABC, MIDI, MusicXML and Larkspan's own JSON files can be read.");
  let text: string;
  try {
    text = decodeText(new Uint8Array(await file.arrayBuffer()));
  } catch {
    return no("The file could not be opened. It may have been moved; choose it again.");
  }
  signal.throwIfAborted();
  if (kind === "json") {
    const read = readSongsFile(text);
    return read.ok ? read.songs : no(read.reason);
  }
  if (kind === "abc") return readTunes(file.name, text, signal, now);
  return [readText(file.name, text, now)];
}

function readText(name: string, text: string, now: Date): Incoming {
  if (text.includes("\0")) return { ok: false, title: null, reason: "This is no text." };
  const read = readSongText(text, name);
  if (read.chart.trim() === "")
    return { ok: false, title: null, reason: "There is no chart and no line of words in this file." };
  if (read.chart.length > longestChart)
    return { ok: false, title: null, reason: "A chart may have at most 100,000 characters." };
  const writtenKey = read.writtenKey ?? findKey({ chart: parseChart(read.chart) })?.key ?? null;
  return { ok: true, song: { ...fresh(now), ...read, writtenKey } };
}

/** A book of tunes gives as many songs. */
async function readTunes(name: string, text: string, signal: AbortSignal, now: Date): Promise<Incoming[]> {
  const tunes = abcTunes(text, mostTunes + 1);
  if (tunes.length === 0) return [{ ok: false, title: null, reason: "There is no tune in this file." }];
  const out: Incoming[] = [];
  for (const [index, tune] of tunes.slice(0, mostTunes).entries()) {
    const part = tunes.length === 1 ? name : `${name.replace(/\.abc$/i, "")} ${index + 1}.abc`;
    out.push(await readTune(new File([[...tune.header, ...tune.body, ""].join("\n")], part), signal, now));
  }
  if (tunes.length > mostTunes)
    out.push({
      ok: false,
      title: null,
      reason: `This file has more than ${mostTunes} tunes. The first ${mostTunes} were read.`,
    });
  return out;
}

async function readTune(file: File, signal: AbortSignal, now: Date): Promise<Incoming> {
  const title = titleOfFile(file.name);
  const read = await readSongFile(file, { signal });
  if (!read.ok) return { ok: false, title, reason: read.reason };
  const voice = read.voices[read.proposed];
  const home = voice?.melody.home ?? null;
  if (!voice || home === null) return { ok: false, title, reason: "No home note could be found in its melody." };
  const named = read.title?.replace(/\s+/g, " ").trim() ?? "";
  return {
    ok: true,
    cautions: read.cautions,
    song: {
      ...fresh(now),
      title: named === "" ? title : [...named].slice(0, 200).join(""),
      chart: lyricLines(voice.lyrics ?? []).join("\n"),
      writtenKey: voice.stated ?? { tonic: home, mode: voice.melody.mode ?? "major" },
      tune: { kind: "melody", notes: [...voice.melody.notes], home },
      beatsPerBar: read.beatsPerBar,
      tempo: read.tempo,
    },
  };
}

function fresh(now: Date) {
  return { tune: null, tags: [], archivedAt: null, playedAt: null, createdAt: now.toISOString() };
}
