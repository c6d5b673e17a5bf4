import { z } from "zod";

/** A grid as `shapeMark` writes it: frets from the bass side on, "x" for silent. */
const mark = z
  .string()
  .max(60)
  .regex(/^(?:x|\d{1,2})(?: (?:x|\d{1,2}))*$/, "Name a shape by its frets, such as x 3 2 0 1 0.");

/** What a player would rather do without, and which shapes they know. One of these is enough for a person. */
export const playerWishes = z.strictObject({
  id: z.uuid(),
  noBarre: z.boolean(),
  noCapo: z.boolean(),
  neverRetune: z.boolean(),
  keepRinging: z.boolean(),
  highestCapo: z.int().min(1).max(9),
  /** shapes the player knows, by how the strings stand to each other (`tuningMark`) */
  known: z.array(z.strictObject({ tuning: z.string().min(1).max(200), shapes: z.array(mark).max(500) })).max(50),
  changedAt: z.iso.datetime(),
});
export type PlayerWishes = z.infer<typeof playerWishes>;
