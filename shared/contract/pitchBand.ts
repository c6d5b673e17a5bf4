import { z } from "zod";

/** Lowest and highest note as fractional MIDI numbers. */
export const pitchBand = z
  .strictObject({ lowMidi: z.number().min(0).max(127), highMidi: z.number().min(0).max(127) })
  .refine((band) => band.lowMidi <= band.highMidi, { message: "The lowest note must not be above the highest." });
