import { Column, Entity, PrimaryColumn } from "typeorm";
import type { StudioRole } from "../../shared/contract/studio/studio";

/** Somebody's time in a studio. Who leaves and comes back has a new one, without what was before. */
@Entity("studio_members")
export class StudioMemberEntity {
  @PrimaryColumn({ type: "uuid" })
  id!: string;

  @Column({ type: "uuid", name: "studio_id" })
  studioId!: string;

  @Column({ type: "uuid", name: "user_id" })
  userId!: string;

  @Column({ type: "text" })
  role!: StudioRole;

  @Column({ type: "text" })
  name!: string;

  @Column({ type: "timestamptz", name: "joined_at", default: () => "now()" })
  joinedAt!: Date;

  @Column({ type: "timestamptz", name: "left_at", nullable: true })
  leftAt!: Date | null;

  @Column({ type: "timestamptz", name: "consent_given_at", nullable: true })
  consentGivenAt!: Date | null;

  @Column({ type: "timestamptz", name: "consent_withdrawn_at", nullable: true })
  consentWithdrawnAt!: Date | null;

  /** a guardian's word for this studio */
  @Column({ type: "timestamptz", name: "guardian_agreed_at", nullable: true })
  guardianAgreedAt!: Date | null;

  /** a guardian's no; no other guardian can be asked about this membership */
  @Column({ type: "timestamptz", name: "guardian_refused_at", nullable: true })
  guardianRefusedAt!: Date | null;

  /** as it was when the pupil agreed; the lower of this and the studio's holds */
  @Column({ type: "smallint", name: "recordings_kept_days", nullable: true })
  recordingsKeptDays!: number | null;
}
