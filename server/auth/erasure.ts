import type { DataSource, EntityManager } from "typeorm";
import { enqueueMail } from "../mail/mail.service";
import type { PersonalDataPart } from "./personalData.service";
import type { SecurityLogService } from "./securityLog.service";

const graceDays = 14;

/** The name of the job that erases accounts whose grace is over. */
export const eraseAccountsTask = "eraseAccounts";

/** Sets the day on which an account goes, and writes to its owner. */
export async function askForErasure(
  manager: EntityManager,
  { id, email }: { id: string; email: string },
): Promise<Date> {
  const [rows]: [{ erase_at: Date }[], number] = await manager.query(
    "UPDATE users SET erase_at = now() + make_interval(days => $2) WHERE id = $1 RETURNING erase_at",
    [id, graceDays],
  );
  const eraseAt = rows[0]?.erase_at ?? new Date();
  const onDay = eraseAt.toLocaleDateString("en-GB", {
    day: "numeric",
    month: "long",
    year: "numeric",
    timeZone: "UTC",
  });
  await enqueueMail(manager, {
    event: `erasure:${id}:${eraseAt.getTime()}`,
    kind: "erasure",
    to: email,
    userId: id,
    data: { onDay },
    path: "/account/sign-in",
  });
  return eraseAt;
}

/** Whoever signs in stays; true if the account was to go. */
export async function cancelErasure(dataSource: DataSource, userId: string): Promise<boolean> {
  const [, count]: [unknown, number] = await dataSource.query(
    "UPDATE users SET erase_at = NULL WHERE id = $1 AND erase_at IS NOT NULL",
    [userId],
  );
  return count > 0;
}

/** Erases accounts whose grace is over: first what lies outside the database, then the row, and with it all that refers to it. */
export async function eraseAccounts(
  dataSource: DataSource,
  parts: readonly PersonalDataPart[],
  log: SecurityLogService,
): Promise<void> {
  const due: { id: string }[] = await dataSource.query("SELECT id FROM users WHERE erase_at <= now()");
  let failure: unknown;
  for (const { id } of due) {
    try {
      for (const part of parts) await part.erase?.(id);
      const [, count]: [unknown, number] = await dataSource.query(
        "DELETE FROM users WHERE id = $1 AND erase_at <= now()",
        [id],
      );
      // The log keeps that it happened, not to whom.
      if (count > 0) await log.note("erased", { userId: null });
    } catch (error) {
      // Of one that cannot go now the others hear nothing; it is tried again.
      failure = error;
    }
  }
  if (failure) throw failure;
}
