import type { EntityManager } from "typeorm";
import { enqueueMail } from "../../mail/mail.service";
import type { PartAccess } from "../assignments/partAccess.service";
import type { StudioAccessService } from "../studioAccess.service";

const threadOf = (partId: string) => `/studio/parts/${partId}`;

/** Tells every teacher of the studio that a take has come in, once a take. */
export async function tellTeachers(
  manager: EntityManager,
  access: StudioAccessService,
  { partId, studioId, pupil, title }: PartAccess,
  handInId: string,
): Promise<void> {
  for (const { memberId, userId, email } of await access.teachersOf(studioId, manager)) {
    await enqueueMail(manager, {
      event: `handed-in:${handInId}:${memberId}`,
      kind: "handedIn",
      to: email,
      userId,
      data: { pupil: pupil.name, song: title, note: null },
      path: threadOf(partId),
    });
  }
}

/** Tells the pupil that a teacher recorded an answer. */
export async function tellPupil(
  manager: EntityManager,
  { partId, pupil, me, title }: PartAccess,
  handInId: string,
): Promise<void> {
  await enqueueMail(manager, {
    event: `answered:${handInId}`,
    kind: "answered",
    to: pupil.email,
    userId: pupil.userId,
    data: { teacher: me.name, song: title, accepted: null, note: null },
    path: threadOf(partId),
  });
}
