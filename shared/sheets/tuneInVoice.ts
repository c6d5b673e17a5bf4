import type { SheetTune } from "./sheet";
import type { SheetLine, SheetPicture } from "./sheetPiece";
import { textPiece } from "./textPiece";

/** Height of the picture of a tune in a voice, px. */
export const tuneHeight = 62;

const bandTop = 2;
const bandHeight = 40;
const middle = bandTop + bandHeight / 2;

/**
 * The tune lying in the singer's voice: the comfort band tinted between its two edges, the reach at both sides hatched,
 * and a mark for every pitch of the tune, the higher the longer it is sung. The ends of the comfort band are named.
 *
 * @param tune bands and marks, MIDI notes
 * @param at upper left corner, and the width it may take, px
 * @returns the picture with the tune in words
 */
export function tuneInVoice(tune: SheetTune, at: { x: number; y: number; width: number }): SheetPicture {
  const { range, comfort, marks } = tune;
  const midis = marks.map(({ midi }) => midi);
  const low = Math.min(range.lowMidi, ...midis) - 0.5;
  const high = Math.max(range.highMidi, ...midis) + 0.5;
  const x = (midi: number) => at.x + ((midi - low) / (high - low)) * at.width;
  const edges = { left: x(comfort.lowMidi - 0.5), right: x(comfort.highMidi + 0.5) };
  const ends = { left: x(range.lowMidi - 0.5), right: x(range.highMidi + 0.5) };
  const top = at.y + bandTop;
  const most = Math.max(0.01, ...marks.map(({ share }) => share));
  const box = { kind: "box", y: top, height: bandHeight, radius: 0 } as const;
  const pieces: SheetPicture["pieces"] = [
    { ...box, x: edges.left, width: edges.right - edges.left, tone: "comfort" },
    ...hatch(ends.left, edges.left, top),
    ...hatch(edges.right, ends.right, top),
    ...[edges.left, edges.right].map((edge) => upright(edge, top, top + bandHeight, 1.4, "lagoon")),
    ...marks.slice(1).map(({ midi }, k): SheetLine => {
      const [from, to] = [x(midis[k]!), x(midi)];
      return { kind: "line", x1: from, y1: at.y + middle, x2: to, y2: at.y + middle, width: 1, tone: "lagoon" };
    }),
    ...marks.map(({ midi, share }) => {
      const half = 3 + (share / most) * (bandHeight / 2 - 6);
      return upright(x(midi), at.y + middle - half, at.y + middle + half, 4.4, "lagoon");
    }),
  ];
  const name = { y: at.y + tuneHeight - 6, size: 12, face: "mono", tone: "lagoon", anchor: "middle" } as const;
  // Where the band is narrow its two names would stand on each other.
  const apart = Math.max(0, 36 - (edges.right - edges.left)) / 2;
  pieces.push(
    textPiece(tune.comfortNames.low, { ...name, x: Math.max(at.x + 12, edges.left - apart) }),
    textPiece(tune.comfortNames.high, { ...name, x: Math.min(at.x + at.width - 12, edges.right + apart) }),
  );
  return { kind: "picture", what: "tune", words: `The tune in your voice: ${tune.words}`, pieces };
}

function upright(x: number, y1: number, y2: number, width: number, tone: SheetLine["tone"]): SheetLine {
  return { kind: "line", x1: x, y1, x2: x, y2, width, tone };
}

/** Slanting lines between two edges, cut off where they would leave them. */
function hatch(from: number, to: number, top: number): SheetLine[] {
  const lines: SheetLine[] = [];
  const step = 6;
  for (let foot = from - bandHeight + step; foot < to; foot += step) {
    const [x1, x2] = [Math.max(from, foot), Math.min(to, foot + bandHeight)];
    if (x2 - x1 < 0.5) continue;
    const bottom = top + bandHeight;
    const y = (x: number) => bottom - (x - foot);
    lines.push({ kind: "line", x1, y1: y(x1), x2, y2: y(x2), width: 0.8, tone: "reach" });
  }
  return lines;
}
