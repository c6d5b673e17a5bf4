import type { TakePicture } from "@/shared/contract/studio/handIn";
import { median } from "@/shared/signal/median";

/** Where the pitch of a take is drawn, in px. */
export interface PlayerPlace {
  width: number;
  /** of the pitch; the waveform stands below */
  height: number;
  durationS: number;
  low: number;
  high: number;
}

const pitchHeight = 132;
const leastSpan = 12;
const gapS = 0.08;

/** Height for the pitch, px. A spoken answer has none to show: of it only the loudness is drawn. */
export function pitchRoom({ trail, tune }: TakePicture): number {
  return trail.length + tune.length > 0 ? pitchHeight : 0;
}

/** Lowest and highest line shown: round the tune and what was sung, an octave at least. */
export function pitchSpan({ trail, tune }: TakePicture): { low: number; high: number } {
  const midis = [...trail, ...tune].map(({ midi }) => midi);
  if (midis.length === 0) return { low: 54, high: 66 };
  const low = Math.floor(midis.reduce((a, b) => Math.min(a, b))) - 1;
  const high = Math.ceil(midis.reduce((a, b) => Math.max(a, b))) + 1;
  const room = Math.max(0, leastSpan - (high - low));
  return { low: low - Math.floor(room / 2), high: high + Math.ceil(room / 2) };
}

export const xOf = ({ width, durationS }: PlayerPlace, t: number): number =>
  (Math.min(durationS, Math.max(0, t)) / Math.max(0.1, durationS)) * width;

export const yOf = ({ height, low, high }: PlayerPlace, midi: number): number =>
  6 + ((high - midi) * (height - 12)) / (high - low);

/** The sung pitch as one path, with a gap wherever nothing was sung. */
export function trailPath(place: PlayerPlace, trail: TakePicture["trail"]): string {
  let before = -Infinity;
  // Long takes are thinned out: points then lie further apart.
  const usual =
    trail.length < 2 ? gapS : Math.max(gapS, 1.6 * median(trail.slice(1).map(({ t }, k) => t - trail[k]!.t)));
  return trail
    .map(({ t, midi }) => {
      const command = t - before > usual ? "M" : "L";
      before = t;
      return `${command}${xOf(place, t).toFixed(1)} ${yOf(place, midi).toFixed(1)}`;
    })
    .join("");
}

/** The waveform as a filled shape round the middle of a strip; the loudest reaches its edges. */
export function wavePath(waveform: readonly number[], width: number, height: number): string {
  if (waveform.length < 2) return "";
  const x = (k: number) => ((k / (waveform.length - 1)) * width).toFixed(1);
  const loudest = Math.max(0.01, ...waveform);
  const swing = (level: number) => Math.max(0.75, (level / loudest) * (height / 2));
  const top = waveform.map((level, k) => `${x(k)} ${(height / 2 - swing(level)).toFixed(1)}`);
  const foot = waveform.map((level, k) => `${x(k)} ${(height / 2 + swing(level)).toFixed(1)}`).reverse();
  return `M${[...top, ...foot].join("L")}Z`;
}
