import { z } from "zod";
import { tonicName } from "./song";

/** "My key for this song": what was chosen, for which voice and instrument, and why. One per song. */
export const decision = z.strictObject({
  id: z.uuid(),
  songId: z.uuid(),
  voiceId: z.uuid().nullable(),
  tonic: tonicName,
  /** semitones from the tune as written, octave included */
  shift: z.int().min(-48).max(48),
  score: z.number().min(0).max(100).nullable(),
  reason: z.string().max(300),
  /** preset or own instrument */
  instrument: z.string().max(80).nullable(),
  way: z
    .strictObject({ retune: z.int().min(-12).max(12), capo: z.int().min(0).max(24), shapeKey: tonicName })
    .nullable(),
  decidedAt: z.iso.datetime(),
});
export type Decision = z.infer<typeof decision>;
