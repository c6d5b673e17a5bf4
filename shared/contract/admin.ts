import { z } from "zod";
import { role } from "./account";

/** A person as administrators see them: nothing of what they sang or wrote. */
export const adminUser = z.strictObject({
  id: z.uuid(),
  email: z.string(),
  role,
  confirmed: z.boolean(),
  secondFactor: z.boolean(),
  suspended: z.boolean(),
  eraseAt: z.iso.datetime().nullable(),
  createdAt: z.iso.datetime(),
  lastSeenAt: z.iso.datetime().nullable(),
});
export type AdminUser = z.infer<typeof adminUser>;

/** A part of an address to look for, and the id of the last person of the page before. */
export const adminUsersQuery = z.strictObject({ q: z.string().max(254).optional(), after: z.uuid().optional() });

export const suspensionRequest = z.strictObject({ suspended: z.boolean() });
export const roleRequest = z.strictObject({ role });

/** How queue and mail are. */
export const serviceHealth = z.strictObject({
  queue: z.strictObject({ waiting: z.int(), retrying: z.int(), failed: z.int(), oldestDueS: z.number() }),
  /** mails of the last seven days by what became of them */
  mail: z.strictObject({ sent: z.int(), sending: z.int(), uncertain: z.int(), refused: z.int() }),
  /** each store of files: whether it answers */
  storage: z.array(z.strictObject({ name: z.string(), up: z.boolean() })),
});
export type ServiceHealth = z.infer<typeof serviceHealth>;

/** Something that touched the safety of an account. Addresses are hashed; equal hashes are one address. */
export const securityEvent = z.strictObject({
  id: z.string(),
  at: z.iso.datetime(),
  what: z.string(),
  userId: z.uuid().nullable(),
  /** who did it, where it was not the person */
  byUserId: z.uuid().nullable(),
  addressHash: z.string().nullable(),
});
export type SecurityEvent = z.infer<typeof securityEvent>;

export const auditQuery = z.strictObject({
  userId: z.uuid().optional(),
  before: z
    .string()
    .regex(/^\d{1,18}$/)
    .optional(),
});
