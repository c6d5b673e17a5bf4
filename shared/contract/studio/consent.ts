import { z } from "zod";
import { email } from "../account";

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
  /** said no to a studio that still waits for them, and was not asked again since; others may be confirmed */
  refusedAt: z.iso.datetime().nullable(),
});
export type GuardianState = z.infer<typeof guardianState>;

/** Whom to ask. */
export const guardianRequest = z.strictObject({ email });

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
  /** "ask": decides about the studios that wait; "keep": takes back the word for every studio, or gives it again */
  link: z.enum(["ask", "keep"]),
  /** the guardian has agreed for all these studios */
  confirmed: z.boolean(),
});
export type GuardianLook = z.infer<typeof guardianLook>;
