import { z } from "zod";

/** What a member agreed to. Teachers see nothing of a member unless `shares`. */
export const memberConsent = z.strictObject({
  givenAt: z.iso.datetime().nullable(),
  withdrawnAt: z.iso.datetime().nullable(),
  /** agreed, but too young to do so alone, and the guardian has not confirmed */
  waitsForGuardian: z.boolean(),
  /** all of it together: teachers may see voice, instrument, takes and threads at this moment */
  shares: z.boolean(),
});
export type MemberConsent = z.infer<typeof memberConsent>;

/** Agreeing (true) or taking it back (false), for one studio. */
export const consentRequest = z.strictObject({ agree: z.boolean() });

/** The sentences under which a pupil agrees; the same for everybody, also for a guardian. */
export const whatTeachersSee = (recordingsKeptDays: number): string[] => [
  "Your name in this studio.",
  "The range and the comfort band of your voice, and when they were measured; not the recordings they come from.",
  "Your favourite instrument, and your wishes and known shapes for it.",
  "The songs your teachers gave you, with the key and the way you have them in.",
  "The takes you hand in: the sound, what was measured in it and how it felt; nothing you sing without handing it in.",
  "What you write to your teachers.",
  `Recordings are deleted ${recordingsKeptDays === 1 ? "one day" : `${recordingsKeptDays} days`} after you hand them in.`,
  "Other pupils see nothing of this. You can take your word back at any time; from that moment your teachers see only your name.",
];

/** Where one stands with a parent or guardian; asked of everybody under the age of digital consent of their country. */
export const guardianState = z.strictObject({
  /** at one's age, in one's country: must a guardian agree? null until the birth year is told */
  needed: z.boolean().nullable(),
  /** the age from which one agrees alone in one's country */
  age: z.int(),
  /** the guardian's address; null while nobody was asked */
  email: z.string().nullable(),
  askedAt: z.iso.datetime().nullable(),
  /** for every studio that one is in at present */
  confirmedAt: z.iso.datetime().nullable(),
  withdrawnAt: z.iso.datetime().nullable(),
});
export type GuardianState = z.infer<typeof guardianState>;

/** Whom to ask. */
export const guardianRequest = z.strictObject({
  email: z.email("Write an e-mail address, like name@example.org.").max(254),
});

/** The secret of a link from a mail. */
export const linkRequest = z.strictObject({ token: z.string().min(1).max(200) });

/** What a guardian reads before deciding. */
export const guardianLook = z.strictObject({
  pupil: z.string(),
  studios: z.array(
    z.strictObject({
      name: z.string(),
      teachers: z.array(z.string()),
      recordingsKeptDays: z.int(),
      confirmed: z.boolean(),
    }),
  ),
  /** what teachers would see and hear, sentence by sentence, in words to the pupil */
  sees: z.array(z.string()),
  /** the guardian has agreed for all these studios */
  confirmed: z.boolean(),
});
export type GuardianLook = z.infer<typeof guardianLook>;
