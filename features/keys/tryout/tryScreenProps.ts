import type { ReactNode } from "react";
import type { Song } from "@/shared/contract/song";
import type { SingingVoice } from "@/shared/keys/keyScore";
import type { KeyName } from "@/shared/music/keyName";
import type { ChartLine } from "@/shared/songs/chart";
import type { SongKeys } from "../useSongKeys";
import type { SungToHandIn } from "./report/sungToHandIn";
import type { TryRecorder } from "./singing/tryRecorder";
import type { TriedKey } from "./setup/tryWishes";

/** What the page where a key is tried is given. */
export interface TryScreenProps {
  song: Song;
  /** the key that is asked for */
  to: KeyName;
  shift: number;
  keys: SongKeys;
  singer: { id: string; name: string } | null;
  /** the voice as keys are judged by, without what was tried */
  voice: SingingVoice | null;
  recorder: TryRecorder;
  /** a line of the chart, chords over its syllables */
  draw: (line: ChartLine) => ReactNode;
  onKey: (key: TriedKey) => void;
  /** under a measured take: what else can be done with it */
  handIn?: (take: SungToHandIn) => ReactNode;
}
