import type { Song } from "@/shared/contract/song";
import type { Try } from "@/shared/contract/try";
import { type TriedVoice, triedVoice } from "@/shared/keys/keyEvidence";
import type { SingingVoice } from "@/shared/keys/keyScore";
import type { PitchBand } from "@/shared/voice/takeReport";
import { type KeyRow, wholeVoice } from "../../keyRows";
import { keyRowsOf } from "../../songKeys";

/** The keys as they stand with some tries. */
export interface TriedRows {
  rows: KeyRow[];
  /** the comfort band that they are judged by, on whole semitones */
  comfort: PitchBand;
  /** why its ends have moved, in sentences */
  why: readonly string[];
}

/** What counts for a voice, whatever song it was sung to. */
export function triesOfVoice<Some extends Try>(tries: readonly Some[], voiceId: string | null): Some[] {
  return tries.filter((each) => each.voiceId === voiceId);
}

/** The voice as the tries of it have left it. A try of this song that could not be measured counts by the song's span. */
export function voiceAfter(song: Song, voice: SingingVoice, tries: readonly Try[]): TriedVoice {
  return triedVoice(
    voice,
    tries.map(({ effort, measures, songId, shift }) => {
      const span = songId === song.id ? spanOf(song, shift) : null;
      return { effort, measures, ...(span ? { span } : null) };
    }),
  );
}

/** The keys of a song for a voice, with what tries of it tell; null while voice or tune is not known. */
export function rowsWith(song: Song, voice: SingingVoice | null, tries: readonly Try[]): TriedRows | null {
  if (!voice) return null;
  const tried = voiceAfter(song, voice, tries);
  const rows = keyRowsOf(song, tried.voice);
  return rows && { rows, comfort: wholeVoice(tried.voice).comfort, why: tried.why };
}

function spanOf({ tune }: Song, shift: number): PitchBand | null {
  if (!tune) return null;
  if (tune.kind === "span") return { lowMidi: tune.lowMidi + shift, highMidi: tune.highMidi + shift };
  const pitches = tune.notes.map(({ midi }) => midi + shift);
  return { lowMidi: Math.min(...pitches), highMidi: Math.max(...pitches) };
}
