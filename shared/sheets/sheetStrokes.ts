import type { Metre } from "../songs/backing/metre";
import type { StrokePattern } from "../ways/hand/strokePattern";
import type { SheetStrokes } from "./sheet";

/**
 * A right-hand pattern as it stands on the sheet.
 *
 * @param pattern eighth by eighth
 * @param metre how the song is counted
 * @returns the strokes without the rests; those on stressed beats are strong
 * @example sheetStrokes({ name: "Down strokes", beats: 2, steps: ["down", "rest", "down", "up"] }, { name: "2/4", beats: 2, quarters: 2, strong: [0] }).strokes.length // => 3
 */
export function sheetStrokes({ name, steps }: Omit<StrokePattern, "beats">, metre: Metre): SheetStrokes {
  const beat = metre.quarters / metre.beats;
  return {
    beats: metre.beats,
    quarters: metre.quarters,
    strokes: steps.flatMap((kind, k) => {
      const at = k / 2;
      return kind === "rest" ? [] : [{ at, kind, strong: metre.strong.some((strong) => strong * beat === at) }];
    }),
    words: name,
  };
}
