import { z } from "zod";
import { songTry } from "../try";
import { mostTakeBytes, mostTakeS, tooLong } from "./takeLimits";

/** The sound and the pitch of a recording as a picture; made on the device that recorded it. */
const takePicture = z.strictObject({
  /** how loud it is from beginning to end, in steps of equal length: 0 silent, 1 as loud as can be */
  waveform: z.array(z.number().min(0).max(1)).max(400),
  /** sung pitch: seconds from the beginning, and fractional MIDI numbers */
  trail: z.array(z.strictObject({ t: z.number().min(0).max(mostTakeS), midi: z.number().min(0).max(127) })).max(4000),
  /** the tune where it was sung, in the singer's octave; empty where it is not known */
  tune: z
    .array(
      z.strictObject({
        t: z.number().min(0).max(mostTakeS),
        durationS: z.number().min(0).max(mostTakeS),
        midi: z.number().min(0).max(127),
      }),
    )
    .max(2000),
});
export type TakePicture = z.infer<typeof takePicture>;

const recording = {
  /** what a pupil sang, or what a teacher says or sings to it */
  kind: z.enum(["pupil-take", "teacher-answer"]),
  bytes: z.int().min(1).max(mostTakeBytes, "A recording may have at most 20 MB."),
  durationS: z.number().min(0).max(mostTakeS, tooLong),
  /** how it felt: 1 easy to 5 straining */
  effort: songTry.shape.effort,
  /** the take held against the tune in the part's key */
  measures: songTry.shape.measures,
  picture: takePicture.nullable(),
};

/**
 * Announces a recording, before its bytes are sent to /api/uploads/<id> by the tus protocol. The id is made by whoever
 * sends, so that an announcement whose answer was lost can be repeated.
 */
export const handInRequest = z.strictObject({
  id: z.uuid(),
  /** the take it was made from, as the device knows it: for each part it is handed in once. Null for an answer */
  takeId: z.uuid().nullable().default(null),
  ...recording,
});
export type HandInRequest = z.infer<typeof handInRequest>;

/** A recording in the thread of a part. One that was deleted keeps its place, without sound, measures and picture. */
export const handIn = z.strictObject({
  id: z.uuid(),
  partId: z.uuid(),
  ...recording,
  /** in the thread of whom it was handed in to */
  state: z.enum(["uploading", "ready", "deleted"]),
  /** the asker's own: they may delete it */
  mine: z.boolean(),
  author: z.strictObject({ memberId: z.uuid(), name: z.string() }),
  createdAt: z.iso.datetime(),
  /** when it is deleted by itself */
  expiresAt: z.iso.datetime(),
});
export type HandIn = z.infer<typeof handIn>;

/** By this its sound can be played for a few minutes, from the storage. */
export const soundLink = z.strictObject({ url: z.url(), expiresAt: z.iso.datetime() });
export type SoundLink = z.infer<typeof soundLink>;
