import { randomUUID } from "node:crypto";
import type { DataSource, EntityManager } from "typeorm";
import { whatTeachersSee } from "../../../shared/contract/studio/whatTeachersSee";
import type { Invite, InviteAcceptance, InviteLook, InviteRequest } from "../../../shared/contract/studio/invite";
import { confirmAddress } from "../../auth/accounts.service";
import { HttpProblem, notFound } from "../../http/httpProblem";
import type { LinkTokensService } from "../../mail/linkTokens.service";
import { enqueueMail } from "../../mail/mail.service";
import type { ConsentService } from "../consent/consent.service";
import type { StudioAccessService } from "../studioAccess.service";
import { StudioMemberEntity } from "../studioMember.entity";
import { becomeTeacher } from "../studios.service";
import { StudioInviteEntity } from "./studioInvite.entity";

const purpose = "studio-invite";
const lifeDays = 7;
const lifeS = lifeDays * 24 * 3600;
const page = "/invite";
/** of one studio, at a time; expired ones do not count */
const mostOpen = 500;

/** Invitations by mail: a link that is good once, for seven days. */
export class InvitesService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly access: StudioAccessService,
    private readonly tokens: LinkTokensService,
    private readonly consent: ConsentService,
  ) {}

  /** Newest first. */
  async list(userId: string, studioId: string): Promise<Invite[]> {
    await this.access.teacher(userId, studioId);
    const rows = await this.dataSource
      .createQueryBuilder(StudioInviteEntity, "invite")
      .where("invite.studioId = :studioId", { studioId })
      .orderBy("invite.sentAt", "DESC")
      .addOrderBy("invite.id")
      .limit(1000)
      .getMany();
    return rows.map(toInvite);
  }

  async make(userId: string, studioId: string, { emails, role, groupId }: InviteRequest): Promise<Invite[]> {
    const me =
      role === "pupil" ? await this.access.teacher(userId, studioId) : await this.access.owner(userId, studioId);
    const distinct = [...new Map(emails.map((email) => [email.toLowerCase(), email])).values()];
    return this.dataSource.transaction(async (manager) => {
      const made: Invite[] = [];
      for (const email of distinct) {
        const rows: { id: string }[] = await manager.query(
          `INSERT INTO studio_invites (id, studio_id, invited_by, email, role, group_id, sent_at, expires_at)
           VALUES ($1, $2, $3, $4, $5, $6, now(), now() + make_interval(days => $7))
           ON CONFLICT (studio_id, lower(email)) WHERE accepted_at IS NULL AND revoked_at IS NULL
           DO UPDATE SET invited_by = $3, role = $5, group_id = $6, sent_at = now(), expires_at = excluded.expires_at
             WHERE studio_invites.role = 'pupil' OR $8
           RETURNING id`,
          [randomUUID(), studioId, me.memberId, email, role, groupId, lifeDays, me.role === "owner"],
        );
        if (!rows[0])
          throw new HttpProblem(
            403,
            "owner-only",
            `The owner has invited ${email} to teach here; only they change that.`,
          );
        made.push(await this.send(manager, rows[0].id));
      }
      const open = await manager
        .createQueryBuilder(StudioInviteEntity, "invite")
        .where("invite.studioId = :studioId AND invite.acceptedAt IS NULL AND invite.revokedAt IS NULL", { studioId })
        .andWhere("invite.expiresAt > now()")
        .getCount();
      if (open > mostOpen)
        throw new HttpProblem(409, "collection-full", `A studio keeps at most ${mostOpen} open invitations.`);
      return made;
    });
  }

  /** A new link in place of the old one. */
  async resend(userId: string, studioId: string, inviteId: string): Promise<Invite> {
    await this.mayChange(userId, studioId, inviteId);
    return this.dataSource.transaction(async (manager) => {
      const [rows]: [object[], number] = await manager.query(
        `UPDATE studio_invites SET sent_at = now(), expires_at = now() + make_interval(days => $3)
         WHERE studio_id = $1 AND id = $2 AND accepted_at IS NULL AND revoked_at IS NULL RETURNING id`,
        [studioId, inviteId, lifeDays],
      );
      if (rows.length === 0) {
        const known = await manager.countBy(StudioInviteEntity, { id: inviteId, studioId });
        if (known === 0) throw notFound("invitation");
        throw new HttpProblem(409, "invite-over", "This invitation was accepted or taken back. Make a new one.");
      }
      return this.send(manager, inviteId);
    });
  }

  /** Takes an invitation back; again changes nothing. */
  async revoke(userId: string, studioId: string, inviteId: string): Promise<void> {
    await this.mayChange(userId, studioId, inviteId);
    await this.dataSource.transaction(async (manager) => {
      const [, count]: [unknown, number] = await manager.query(
        `UPDATE studio_invites SET revoked_at = CASE WHEN accepted_at IS NULL THEN coalesce(revoked_at, now()) END
         WHERE studio_id = $1 AND id = $2`,
        [studioId, inviteId],
      );
      if (count === 0) throw notFound("invitation");
      await this.tokens.forget(manager, inviteId, [purpose]);
    });
  }

  /** What whoever holds the link learns; null if it is good no more. */
  async look(token: string): Promise<InviteLook | null> {
    const found = await this.tokens.look(this.dataSource, purpose, token);
    const rows: (Omit<InviteLook, "sees" | "expiresAt"> & { expiresAt: Date })[] = await this.dataSource.query(
      `SELECT s.name AS studio, i.email, i.role, i.expires_at AS "expiresAt",
              s.recordings_kept_days AS "recordingsKeptDays", t.teachers, coalesce(b.name, t.teachers[1]) AS teacher
       FROM studio_invites i JOIN studios s ON s.id = i.studio_id
       LEFT JOIN studio_members b ON b.id = i.invited_by AND b.left_at IS NULL
       CROSS JOIN LATERAL (
         SELECT array_agg(m.name ORDER BY m.role DESC, m.joined_at, m.id) AS teachers FROM studio_members m
         WHERE m.studio_id = s.id AND m.left_at IS NULL AND m.role <> 'pupil') t
       WHERE i.id = $1 AND i.accepted_at IS NULL AND i.revoked_at IS NULL`,
      [found?.subject ?? null],
    );
    const [row] = rows;
    if (!row) return null;
    return { ...row, sees: whatTeachersSee(row.recordingsKeptDays), expiresAt: row.expiresAt.toISOString() };
  }

  /** Joins; the id of the studio, or null if the link is good no more. */
  async accept(userId: string, { token, name, agree }: InviteAcceptance): Promise<string | null> {
    return this.dataSource.transaction(async (manager) => {
      const spent = await this.tokens.spend(manager, purpose, token);
      const [rows]: [{ studioId: string; groupId: string | null; role: Invite["role"] }[], number] =
        await manager.query(
          `UPDATE studio_invites SET accepted_at = now()
           WHERE id = $1 AND accepted_at IS NULL AND revoked_at IS NULL
           RETURNING studio_id AS "studioId", group_id AS "groupId", role`,
          [spent?.subject ?? null],
        );
      const [invite] = rows;
      if (!spent || !invite) return null;
      const { studioId, groupId, role } = invite;
      const present = await manager
        .createQueryBuilder(StudioMemberEntity, "m")
        .where("m.studioId = :studioId AND m.userId = :userId AND m.leftAt IS NULL", { studioId, userId })
        .getExists();
      if (present) throw new HttpProblem(409, "already-member", "You are in this studio already.");
      const memberId = randomUUID();
      await manager.insert(StudioMemberEntity, { id: memberId, studioId, userId, role, name });
      if (groupId !== null)
        await manager.query("INSERT INTO studio_group_members (group_id, member_id, studio_id) VALUES ($1, $2, $3)", [
          groupId,
          memberId,
          studioId,
        ]);
      if (role === "co-teacher") await becomeTeacher(manager, userId);
      // Whoever has the link reads the mails of that address: if it is the account's own, nobody needs to ask again.
      await confirmAddress(manager, userId, spent.email);
      if (agree) await this.consent.give(manager, memberId, userId);
      return studioId;
    });
  }

  /** Who teaches is the owner's to say, also while it is an invitation. */
  private async mayChange(userId: string, studioId: string, inviteId: string): Promise<void> {
    await this.access.teacher(userId, studioId);
    if ((await this.dataSource.manager.countBy(StudioInviteEntity, { id: inviteId, studioId, role: "co-teacher" })) > 0)
      await this.access.owner(userId, studioId);
  }

  private async send(manager: EntityManager, inviteId: string): Promise<Invite> {
    const invite = await manager.findOneByOrFail(StudioInviteEntity, { id: inviteId });
    const [names]: { studio: string; teacher: string }[] = await manager.query(
      `SELECT s.name AS studio, m.name AS teacher FROM studio_invites i JOIN studios s ON s.id = i.studio_id
       JOIN studio_members m ON m.studio_id = s.id AND m.left_at IS NULL AND m.role <> 'pupil'
       WHERE i.id = $1 ORDER BY m.id = i.invited_by DESC, m.role DESC LIMIT 1`,
      [inviteId],
    );
    const { email } = invite;
    const token = await this.tokens.issue(manager, { purpose, email, lifeS, subject: inviteId });
    await enqueueMail(manager, {
      event: `invite:${token.id}`,
      kind: "invite",
      to: email,
      userId: null,
      data: { teacher: names?.teacher ?? "", studio: names?.studio ?? "" },
      path: page,
      token,
    });
    return toInvite(invite);
  }
}

function toInvite({ id, email, role, groupId, sentAt, expiresAt, acceptedAt, revokedAt }: StudioInviteEntity): Invite {
  const over = expiresAt.getTime() <= Date.now() ? "expired" : "open";
  const state = acceptedAt ? "accepted" : revokedAt ? "revoked" : over;
  return { id, email, role, groupId, state, sentAt: sentAt.toISOString(), expiresAt: expiresAt.toISOString() };
}
