import { z } from "zod";

/** The kinds of mail that one may do without, each with its default: the summary comes only to those who ask for it. */
export const mailPreferences = z.strictObject({
  assigned: z.boolean(),
  handedIn: z.boolean(),
  answered: z.boolean(),
  weekly: z.boolean(),
});
export type MailPreferences = z.infer<typeof mailPreferences>;
export type OptionalMail = keyof MailPreferences;

/** What stands behind the question mark of an unsubscribe link. */
export const unsubscribeQuery = z.strictObject({ token: z.string().min(1).max(200) });

/** Which kind of mail was switched off. */
export const unsubscribed = z.strictObject({ kind: z.enum(["assigned", "handedIn", "answered", "weekly"]) });
export type Unsubscribed = z.infer<typeof unsubscribed>;
