import { Column, Entity, PrimaryColumn } from "typeorm";
import type { Studio } from "../../shared/contract/studio/studio";

@Entity("studios")
export class StudioEntity {
  @PrimaryColumn({ type: "uuid" })
  id!: string;

  /** the account with which it goes; the same as that of the member who is its owner */
  @Column({ type: "uuid", name: "owner_id" })
  ownerId!: string;

  @Column({ type: "text" })
  name!: string;

  @Column({ type: "jsonb", nullable: true })
  event!: Studio["event"];

  @Column({ type: "smallint", name: "recordings_kept_days" })
  recordingsKeptDays!: number;

  @Column({ type: "timestamptz", name: "created_at", default: () => "now()" })
  createdAt!: Date;
}
