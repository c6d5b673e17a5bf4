import { z } from "zod";

const fret = z.int().min(0).max(36);
const string = z.int().min(0).max(11);

/** One fingering of a chord, as the engine gives it. */
export const shape = z.strictObject({
  frets: z.array(fret.nullable()).min(1).max(12),
  fingers: z.array(z.int().min(0).max(5)).min(1).max(12),
  barre: z.strictObject({ fret, fromString: string, toString: string }).nullable(),
  reachMm: z.number().min(0).max(2000),
  ease: z.number().min(0).max(1),
  roots: z.array(string).max(12),
});
