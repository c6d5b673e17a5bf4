import { Column, Entity, PrimaryColumn } from "typeorm";

/** The parent or guardian that a pupil named. For which studios they gave their word stands with the memberships. */
@Entity("guardians")
export class GuardianEntity {
  @PrimaryColumn({ type: "uuid", name: "user_id" })
  userId!: string;

  @Column({ type: "text" })
  email!: string;

  @Column({ type: "timestamptz", name: "asked_at", default: () => "now()" })
  askedAt!: Date;

  @Column({ type: "timestamptz", name: "confirmed_at", nullable: true })
  confirmedAt!: Date | null;

  @Column({ type: "timestamptz", name: "withdrawn_at", nullable: true })
  withdrawnAt!: Date | null;
}
