import { Column, Entity, PrimaryColumn } from "typeorm";
import type { Part, PartState } from "../../../shared/contract/studio/assignment";

@Entity("assignment_parts")
export class AssignmentPartEntity {
  @PrimaryColumn({ type: "uuid" })
  id!: string;

  @Column({ type: "uuid", name: "studio_id" })
  studioId!: string;

  @Column({ type: "uuid", name: "assignment_id" })
  assignmentId!: string;

  @Column({ type: "uuid", name: "member_id" })
  memberId!: string;

  /** the copy on the pupil's own shelf */
  @Column({ type: "uuid", name: "song_id", nullable: true })
  songId!: string | null;

  @Column({ type: "text" })
  tonic!: string;

  @Column({ type: "smallint" })
  shift!: number;

  @Column({ type: "jsonb", nullable: true })
  instrument!: Part["instrument"];

  @Column({ type: "jsonb", nullable: true })
  way!: Part["way"];

  @Column({ type: "text" })
  note!: string;

  @Column({ type: "text" })
  state!: PartState;

  /** when the newest take was handed in, and how it felt */
  @Column({ type: "timestamptz", name: "handed_in_at", nullable: true })
  handedInAt!: Date | null;

  @Column({ type: "smallint", nullable: true })
  effort!: number | null;

  @Column({ type: "timestamptz", name: "answered_at", nullable: true })
  answeredAt!: Date | null;
}
