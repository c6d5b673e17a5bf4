import { useWindowDimensions } from "react-native";
import { SpanLadder } from "@/features/span/SpanLadder";
import type { LadderLabel } from "@/features/span/LadderLabels";
import type { SingingVoice } from "@/shared/keys/keyScore";
import type { PitchBand } from "@/shared/voice/takeReport";
import { bandWords, noteWord, semitonesOf } from "./noteWords";
import { longestNote, marksOfTimes, type NoteTime } from "./timeOnNotes";
import { semitoneWords } from "@/shared/music/moveWords";

export interface VoiceLadderProps {
  voice: SingingVoice;
  /** how long each note was sung; empty where nothing was */
  times: readonly NoteTime[];
  /** whether the ends of the range were sung or are only said */
  ends: "held" | "range";
}

const gutters = 32;
const widest = 460;
const narrowest = 280;

/** The ladder of a voice: column, time on each note, and the four notes that matter by name. */
export function VoiceLadder({ voice, times, ends }: VoiceLadderProps) {
  const width = Math.max(narrowest, Math.min(widest, useWindowDimensions().width - gutters));
  const range = whole(voice.range);
  const comfort = whole(voice.comfort);
  const longest = longestNote(times);
  const held = longest ? `held: ${noteWord(longest.midi)} for ${longest.seconds.toFixed(1)} s` : null;
  const longestWords = longest ? ` Longest: ${noteWord(longest.midi)}, ${longest.seconds.toFixed(1)} seconds.` : "";
  return (
    <SpanLadder
      voice={{ range, comfort }}
      marks={marksOfTimes(times)}
      step={semitonesOf(range) > 24 ? 15 : 18}
      width={width}
      labels={labelsOf(range, comfort, ends)}
      bracket={[`${semitoneWords(semitonesOf(comfort))} that`, "you can sing in for", "a whole song"]}
      {...(held === null ? null : { note: held })}
      summary={`Voice ${ends === "held" ? "heard" : "set"} from ${bandWords(range)}. Comfort band ${bandWords(comfort)}.${longestWords}`}
      testID="voice-ladder"
    />
  );
}

/** The picture stands on semitones, as its words do. */
function whole({ lowMidi, highMidi }: PitchBand): PitchBand {
  return { lowMidi: Math.round(lowMidi), highMidi: Math.round(highMidi) };
}

function labelsOf(range: PitchBand, comfort: PitchBand, ends: VoiceLadderProps["ends"]): LadderLabel[] {
  const [highest, lowest] = ends === "held" ? ["highest held", "lowest held"] : ["highest", "lowest"];
  const label = (midi: number, text: string, tone: LadderLabel["tone"]): LadderLabel => ({
    midi,
    name: noteWord(midi),
    text,
    tone,
  });
  const labels = [label(comfort.highMidi, "comfort top", "comfort"), label(comfort.lowMidi, "comfort low", "comfort")];
  if (range.highMidi > comfort.highMidi) labels.push(label(range.highMidi, highest, "reach"));
  if (range.lowMidi < comfort.lowMidi) labels.push(label(range.lowMidi, lowest, "reach"));
  return labels;
}
