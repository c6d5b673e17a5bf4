import { Column, Entity, PrimaryColumn } from "typeorm";
import type { Invite } from "../../../shared/contract/studio/invite";

/** An invitation; its link's token refers to it as its subject. */
@Entity("studio_invites")
export class StudioInviteEntity {
  @PrimaryColumn({ type: "uuid" })
  id!: string;

  @Column({ type: "uuid", name: "studio_id" })
  studioId!: string;

  @Column({ type: "uuid", name: "invited_by", nullable: true })
  invitedBy!: string | null;

  @Column({ type: "text" })
  email!: string;

  @Column({ type: "text" })
  role!: Invite["role"];

  @Column({ type: "uuid", name: "group_id", nullable: true })
  groupId!: string | null;

  @Column({ type: "timestamptz", name: "sent_at", default: () => "now()" })
  sentAt!: Date;

  @Column({ type: "timestamptz", name: "expires_at" })
  expiresAt!: Date;

  @Column({ type: "timestamptz", name: "accepted_at", nullable: true })
  acceptedAt!: Date | null;

  @Column({ type: "timestamptz", name: "revoked_at", nullable: true })
  revokedAt!: Date | null;
}
