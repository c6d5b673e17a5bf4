import { z } from "zod";
import { email } from "../account";
import { linkRequest } from "./consent";
import { memberName, studioRole } from "./studio";

const invitedRole = studioRole.exclude(["owner"]);

/** An invitation as the teachers see it. */
export const invite = z.strictObject({
  id: z.uuid(),
  email: z.string(),
  role: invitedRole,
  /** the group that the pupil will be in */
  groupId: z.uuid().nullable(),
  state: z.enum(["open", "expired", "accepted", "revoked"]),
  /** when the newest mail was written */
  sentAt: z.iso.datetime(),
  expiresAt: z.iso.datetime(),
});
export type Invite = z.infer<typeof invite>;

/** Whom to invite. Whoever has an open invitation already gets a new link in its place. */
export const inviteRequest = z.strictObject({
  emails: z.array(email).min(1, "Write at least one address.").max(50, "Invite at most 50 at a time."),
  role: invitedRole.default("pupil"),
  groupId: z.uuid().nullable().default(null),
});
export type InviteRequest = z.infer<typeof inviteRequest>;

/** What whoever has the link learns before accepting, without an account. */
export const inviteLook = z.strictObject({
  studio: z.string(),
  /** who invites */
  teacher: z.string(),
  /** everybody who will see what is shared */
  teachers: z.array(z.string()),
  email: z.string(),
  role: invitedRole,
  /** what teachers see of a pupil who agrees, sentence by sentence */
  sees: z.array(z.string()),
  recordingsKeptDays: z.int(),
  expiresAt: z.iso.datetime(),
});
export type InviteLook = z.infer<typeof inviteLook>;

/** Joining. One may join without agreeing and agree later; agreeing needs the birth year (409 "birth-year-needed"). */
export const inviteAcceptance = z.strictObject({
  token: linkRequest.shape.token,
  name: memberName,
  agree: z.boolean(),
});
export type InviteAcceptance = z.infer<typeof inviteAcceptance>;
