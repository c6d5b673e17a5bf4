import type { Mode } from "@/shared/music/keyName";
import type { PartMark, PartName } from "@/shared/songs/formSketch";

/** How the recording's home note was found. */
type HomeSource = "hummed" | "sung" | "tapped" | "named";

/** What somebody has noted while listening. Times in seconds. */
export interface Listening {
  taps: readonly number[];
  /** the chosen reading of the taps, or what was typed; null = none yet */
  tempo: number | null;
  beatsPerBar: number;
  marks: readonly PartMark[];
  /** when the first part began, by the clock that taps and marks are given in; null before */
  startedS: number | null;
  endS: number | null;
  home: { tonic: string; mode: Mode | null; from: HomeSource; why: string } | null;
}

export type ListeningEvent =
  | { kind: "tap"; atS: number }
  | { kind: "forgetTaps" }
  | { kind: "tempo"; tempo: number | null }
  | { kind: "beatsPerBar"; beats: number }
  | { kind: "part"; name: PartName; atS: number }
  | { kind: "over"; atS: number }
  | { kind: "undoPart" }
  | { kind: "home"; home: Listening["home"] };

export function beginListening(tempo: number | null, beatsPerBar: number | null): Listening {
  return { taps: [], tempo, beatsPerBar: beatsPerBar ?? 4, marks: [], startedS: null, endS: null, home: null };
}

/** Taps kept for the tempo: enough for a steady middle, and a change of pace is followed. */
const keptTaps = 24;

/** Notes of a listener, one event at a time. The first part starts the clock of the form. */
export function listening(state: Listening, event: ListeningEvent): Listening {
  switch (event.kind) {
    case "tap":
      return { ...state, taps: [...state.taps, event.atS].slice(-keptTaps), tempo: null };
    case "forgetTaps":
      return { ...state, taps: [], tempo: null };
    case "tempo":
      return { ...state, tempo: event.tempo };
    case "beatsPerBar":
      return { ...state, beatsPerBar: event.beats };
    case "part": {
      if (state.endS !== null) return state;
      const startedS = state.startedS ?? event.atS;
      const atS = event.atS - startedS;
      return { ...state, startedS, marks: [...state.marks, { name: event.name, atS }] };
    }
    case "over":
      return state.startedS === null ? state : { ...state, endS: event.atS - state.startedS };
    case "undoPart": {
      if (state.endS !== null) return { ...state, endS: null };
      const marks = state.marks.slice(0, -1);
      return { ...state, marks, startedS: marks.length === 0 ? null : state.startedS };
    }
    case "home":
      return { ...state, home: event.home };
  }
}
