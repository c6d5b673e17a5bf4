import { z } from "zod";
import { decision } from "../decision";
import { tonicName } from "../song";
import { playedOn } from "./assignment";
import { studioName } from "./studio";

/** One key for all of a group in one song, and how each of them comes to it. */
export const groupKey = z.strictObject({
  /** of the shelf of whoever decided */
  songId: z.uuid(),
  title: z.string().trim().min(1).max(200),
  tonic: tonicName,
  /** who has it hardest and by how much; empty as soon as one of them no longer agrees */
  reason: z.string().max(500),
  pupils: z
    .array(
      z.strictObject({
        memberId: z.uuid(),
        /** semitones from the tune as written, octave included */
        shift: decision.shape.shift,
        score: z.number().min(0).max(100).nullable(),
        instrument: playedOn.nullable(),
        way: decision.shape.way,
      }),
    )
    .max(500),
  decidedAt: z.iso.datetime(),
});
export type GroupKey = z.infer<typeof groupKey>;

/** Some of a studio's pupils; a pupil may be in several. */
export const studioGroup = z.strictObject({
  id: z.uuid(),
  name: z.string(),
  memberIds: z.array(z.uuid()),
  /** one for each song that was decided, newest first; without pupils who no longer agree */
  keys: z.array(groupKey),
});
export type StudioGroup = z.infer<typeof studioGroup>;

/** What makes or changes a group. */
export const groupRequest = z.strictObject({ name: studioName, memberIds: z.array(z.uuid()).max(500) });
export type GroupRequest = z.infer<typeof groupRequest>;
