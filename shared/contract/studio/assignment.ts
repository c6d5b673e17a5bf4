import { z } from "zod";
import { decision } from "../decision";
import { song, tonicName } from "../song";

/** The instrument that a part is for: a preset, or one of the pupil's own, and what it is called. */
export const playedOn = z.strictObject({ id: z.string().min(1).max(80), name: z.string().trim().min(1).max(80) });

const day = z.iso.date("Give the day as in 2026-12-10.");
const words = z.string().trim().max(2000, "At most 2,000 characters.");

/** The song as it was when it was given. */
const givenSong = song.pick({
  title: true,
  chart: true,
  writtenKey: true,
  tune: true,
  beatsPerBar: true,
  tempo: true,
});
export type GivenSong = z.infer<typeof givenSong>;

/** How one pupil has the song. */
const partKey = {
  tonic: tonicName,
  /** semitones from the tune as written, octave included */
  shift: decision.shape.shift,
  instrument: playedOn.nullable(),
  way: decision.shape.way,
};

/**
 * Made by whoever sends, so that what was sent can be sent again when its answer was lost: what is there by this id is
 * the answer then. The server makes one where none is given.
 */
const sentId = z.uuid().exactOptional();

/** A song for many at once, for each in their own key. */
export const assignmentRequest = z.strictObject({
  id: sentId,
  /** of the teacher's own shelf */
  songId: z.uuid(),
  dueOn: day.nullable(),
  /** to all of them */
  note: words,
  parts: z
    .array(
      z.strictObject({
        memberId: z.uuid(),
        ...partKey,
        score: decision.shape.score,
        /** why this key, in a sentence; stands with the pupil's own decision */
        reason: decision.shape.reason,
        /** to this one */
        note: words,
      }),
    )
    .min(1, "Choose at least one pupil.")
    .max(300, "Give a song to at most 300 at a time."),
});
export type AssignmentRequest = z.infer<typeof assignmentRequest>;

const partState = z.enum(["assigned", "handed-in", "returned", "accepted"]);
export type PartState = z.infer<typeof partState>;

/** The newest take handed in: when, and how it felt. */
export const lastTake = z.strictObject({ at: z.iso.datetime(), effort: z.int().min(1).max(5).nullable() }).nullable();

/** A pupil's part of an assignment, as its teachers see it in a table. Without consent only the name tells something. */
const partRow = z.strictObject({
  id: z.uuid(),
  memberId: z.uuid(),
  pupil: z.string(),
  shares: z.boolean(),
  ...partKey,
  state: partState,
  lastTake,
});
export type PartRow = z.infer<typeof partRow>;

const given = {
  id: z.uuid(),
  studioId: z.uuid(),
  title: z.string(),
  dueOn: day.nullable(),
  note: z.string(),
  assignedAt: z.iso.datetime(),
  /** the teacher's name; null if they have left */
  assignedBy: z.string().nullable(),
};

/** An assignment in a list, and how far it is. */
export const assignmentListing = z.strictObject({
  ...given,
  counts: z.strictObject({ parts: z.int(), waiting: z.int(), accepted: z.int() }),
});
export type AssignmentListing = z.infer<typeof assignmentListing>;

/** An assignment with all its parts. */
export const assignment = z.strictObject({ ...given, song: givenSong, parts: z.array(partRow) });
export type Assignment = z.infer<typeof assignment>;

/** What may be changed of one that was given. */
export const assignmentChange = z.strictObject({ dueOn: day.nullable(), note: words });
export type AssignmentChange = z.infer<typeof assignmentChange>;

/** A part in the pupil's own list. */
export const partListing = z.strictObject({
  id: z.uuid(),
  studio: z.strictObject({ id: z.uuid(), name: z.string() }),
  title: z.string(),
  tonic: tonicName,
  /** the copy on the pupil's own shelf; null if it was removed there */
  songId: z.uuid().nullable(),
  state: partState,
  dueOn: day.nullable(),
  assignedAt: z.iso.datetime(),
  assignedBy: z.string().nullable(),
});
export type PartListing = z.infer<typeof partListing>;

/** One part in full, for the pupil and for the teachers. */
export const part = z.strictObject({
  ...partListing.shape,
  assignmentId: z.uuid(),
  memberId: z.uuid(),
  pupil: z.string(),
  /** which side the asker is on */
  side: z.enum(["pupil", "teacher"]),
  /** the pupil agrees at present: the thread can be read by the teachers, and takes can be handed in */
  shares: z.boolean(),
  mode: song.shape.writtenKey.unwrap().shape.mode,
  ...partKey,
  song: givenSong,
  /** what the teacher wrote to all, and to this pupil */
  note: z.string(),
  partNote: z.string(),
  lastTake,
  /** for the pupil: which takes lie in the thread, as the device knows them that recorded them */
  takesHandedIn: z.array(z.uuid()),
  recordingsKeptDays: z.int(),
});
export type Part = z.infer<typeof part>;

/** What a teacher changes of a part: the key and way, the note, or the answer to what was handed in. Anything may be left out. */
export const partChange = z.strictObject({
  tonic: tonicName.exactOptional(),
  shift: decision.shape.shift.exactOptional(),
  instrument: playedOn.nullable().exactOptional(),
  way: decision.shape.way.exactOptional(),
  partNote: words.exactOptional(),
  /** the answer; the pupil gets one mail for it */
  state: partState.extract(["returned", "accepted"]).exactOptional(),
  /** `lastTake.at` as the teacher saw it, null where none was there: with an answer, so that none is given to a take nobody heard */
  seenTakeAt: z.iso.datetime().nullable().exactOptional(),
  /** words that go with the answer: a comment in the thread, and quoted in the mail */
  message: words.min(1).exactOptional(),
  /** of the comment that the message becomes */
  messageId: sentId,
});
export type PartChange = z.infer<typeof partChange>;

/** Words in a part's thread; at a time in a take, if they stand there. */
export const comment = z.strictObject({
  id: z.uuid(),
  handInId: z.uuid().nullable(),
  /** seconds from the beginning of the take */
  atS: z.number().min(0).max(7200).nullable(),
  text: z.string(),
  author: z.strictObject({ memberId: z.uuid(), name: z.string(), role: z.enum(["owner", "co-teacher", "pupil"]) }),
  mine: z.boolean(),
  createdAt: z.iso.datetime(),
});
export type Comment = z.infer<typeof comment>;

/** What is written into a thread. */
export const commentRequest = z.strictObject({
  id: sentId,
  text: words.min(1, "Write something."),
  handInId: z.uuid().nullable().default(null),
  atS: comment.shape.atS.default(null),
});
export type CommentRequest = z.infer<typeof commentRequest>;
