import { Column, Entity, PrimaryColumn } from "typeorm";
import type { GivenSong } from "../../../shared/contract/studio/assignment";

@Entity("assignments")
export class AssignmentEntity {
  @PrimaryColumn({ type: "uuid" })
  id!: string;

  @Column({ type: "uuid", name: "studio_id" })
  studioId!: string;

  /** the member who gave it */
  @Column({ type: "uuid", name: "assigned_by", nullable: true })
  assignedBy!: string | null;

  /** the song as it was then */
  @Column({ type: "jsonb" })
  song!: GivenSong;

  @Column({ type: "date", name: "due_on", nullable: true })
  dueOn!: string | null;

  @Column({ type: "text" })
  note!: string;

  @Column({ type: "timestamptz", name: "created_at", default: () => "now()" })
  createdAt!: Date;
}
