import { z } from "zod";
import { tonicName } from "./song";

/** What was chosen, and why. */
const choice = {
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
  /** also tells one choice for a song and voice from the next */
  decidedAt: z.iso.datetime(),
};

const earlierChoice = z.strictObject(choice);
export type EarlierChoice = z.infer<typeof earlierChoice>;

/** How many choices before the present one are kept. */
export const mostEarlier = 20;

/** "My key for this song": one for each song and voice; without a voice it holds for whoever sings. */
export const decision = z.strictObject({
  id: z.uuid(),
  songId: z.uuid(),
  voiceId: z.uuid().nullable(),
  ...choice,
  /** what was decided before, newest first */
  earlier: z.array(earlierChoice).max(mostEarlier).default([]),
});
export type Decision = z.infer<typeof decision>;
