import type { KeyMark, SingingVoice } from "@/shared/keys/keyScore";
import { SpanLadder } from "./SpanLadder";
import { zoneOf, type LadderStep } from "./ladderGeometry";

/** A voice and a song for the picture on the first page: heard F3 to C5, comfortable G3 to A4. */
const voice: SingingVoice = { range: { lowMidi: 53, highMidi: 72 }, comfort: { lowMidi: 55, highMidi: 69 } };

/** Shares of the time, from the lowest note up, as the song stands in F. */
const asWritten: readonly (readonly [midi: number, share: number])[] = [
  [60, 0.04],
  [62, 0.06],
  [64, 0.05],
  [65, 0.18],
  [67, 0.14],
  [69, 0.22],
  [70, 0.08],
  [72, 0.16],
  [74, 0.07],
];

function marksMoved(by: number, home: number): KeyMark[] {
  return asWritten.map(([written, share]) => {
    const midi = written + by;
    return { midi, share, zone: zoneOf(midi, voice), home: midi === home };
  });
}

/** The whole idea in one picture: a song as written at the left of a voice, the same song in its key at the right. */
export function HomeLadder({ width, step }: { width: number; step: LadderStep }) {
  return (
    <SpanLadder
      voice={voice}
      leftMarks={marksMoved(0, 65)}
      marks={marksMoved(-5, 60)}
      step={step}
      width={width}
      scale={{ low: 52, high: 75 }}
      columnWords={["your", "voice"]}
      heads={{
        left: { title: "A song as written, in F", text: "D5 is out of reach", tone: "beyond" },
        right: { title: "For this voice, in C", text: "all of it sits well", tone: "comfort" },
      }}
      summary="A pitch ladder. In the middle a column: the notes you sing comfortably. At the left a song in F as written, its top note D5 beyond the column. At the right the same song in C, wholly inside."
      testID="home-ladder"
    />
  );
}
