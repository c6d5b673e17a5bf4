import { z } from "zod";
import { memberConsent } from "./consent";

export const studioName = z.string().trim().min(1, "Give it a name.").max(80, "A name may have at most 80 characters.");
/** What a member is called in a studio; accounts themselves have no names. */
export const memberName = z
  .string()
  .trim()
  .min(1, "Say what you are called.")
  .max(80, "A name may have at most 80 characters.");

export const studioRole = z.enum(["owner", "co-teacher", "pupil"]);
export type StudioRole = z.infer<typeof studioRole>;

const event = z.strictObject({ name: studioName, date: z.iso.date("Give the day as in 2026-12-10.") });
const keptDays = z.int().min(1).max(365);

/** A teacher's group of pupils, as one of its members sees it. */
export const studio = z.strictObject({
  id: z.uuid(),
  name: z.string(),
  /** the asker's own place in it */
  me: z.strictObject({ memberId: z.uuid(), name: z.string(), role: studioRole, consent: memberConsent }),
  /** those who may see what pupils agreed to show, owner first */
  teachers: z.array(z.strictObject({ memberId: z.uuid(), name: z.string(), role: studioRole })),
  /** an evening that the studio works towards */
  event: event.nullable(),
  /** days after which recordings handed in are deleted; to a pupil, no more than when they agreed */
  recordingsKeptDays: keptDays,
  /** how many pupils there are, and how many takes wait for an answer; null for a pupil */
  counts: z.strictObject({ pupils: z.int(), waiting: z.int() }).nullable(),
  createdAt: z.iso.datetime(),
});
export type Studio = z.infer<typeof studio>;

/** What a studio is made from. */
export const newStudio = z.strictObject({
  name: studioName,
  /** what its owner is called there */
  teacherName: memberName,
  event: event.nullable().default(null),
  recordingsKeptDays: keptDays.default(90),
});
export type NewStudio = z.infer<typeof newStudio>;

/** What its teachers may change of a studio; how long recordings are kept, only its owner. */
export const studioChange = z.strictObject({ name: studioName, event: event.nullable(), recordingsKeptDays: keptDays });
export type StudioChange = z.infer<typeof studioChange>;

/**
 * What may be changed of a member: one's own name; by the owner also the role. Making a teacher "owner" passes the
 * studio on, and its owner becomes a co-teacher.
 */
export const memberChange = z.strictObject({ name: memberName.exactOptional(), role: studioRole.exactOptional() });
export type MemberChange = z.infer<typeof memberChange>;
