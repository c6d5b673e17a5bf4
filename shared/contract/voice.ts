import { z } from "zod";
import { pitchBand } from "./pitchBand";

/** A named profile of a person's singing voice. `byHand` is set where the notes were given without singing. */
export const voice = z.strictObject({
  id: z.uuid(),
  name: z.string().trim().min(1, "Give the voice a name.").max(80),
  byHand: z.strictObject({ range: pitchBand, comfort: pitchBand }).nullable(),
  createdAt: z.iso.datetime(),
});
export type Voice = z.infer<typeof voice>;
