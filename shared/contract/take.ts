import { z } from "zod";
import { pitchBand } from "./pitchBand";

const sungNote = z.strictObject({
  start: z.number().min(0),
  end: z.number().min(0),
  midi: z.number().min(0).max(127),
  steadinessCents: z.number().min(0),
  sustained: z.boolean(),
  clear: z.boolean(),
});

/** One recorded piece of singing, as numbers: the sound itself stays on the device. */
export const take = z.strictObject({
  id: z.uuid(),
  voiceId: z.uuid(),
  /** a sung phrase, or single notes held one by one under guidance */
  kind: z.enum(["phrase", "hold"]).default("phrase"),
  /** which ends of the voice it speaks for; a guided hold may have looked for one only */
  shows: z.enum(["both", "low", "high"]).default("both"),
  sungAt: z.iso.datetime(),
  warmedUp: z.boolean().nullable(),
  /** how it felt: 1 easy to 5 straining */
  effort: z.int().min(1).max(5).nullable(),
  durationS: z.number().min(0).max(600),
  range: pitchBand,
  comfort: pitchBand,
  estimate: pitchBand,
  tuningCents: z.number().min(-50).max(50),
  certainty: z.number().min(0).max(1),
  reasons: z.array(z.string().max(300)).max(20),
  notes: z.array(sungNote).max(2000),
});
export type Take = z.infer<typeof take>;
