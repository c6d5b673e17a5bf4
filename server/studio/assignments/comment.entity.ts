import { Column, Entity, PrimaryColumn } from "typeorm";

@Entity("comments")
export class CommentEntity {
  @PrimaryColumn({ type: "uuid" })
  id!: string;

  @Column({ type: "uuid", name: "part_id" })
  partId!: string;

  /** the member who wrote it */
  @Column({ type: "uuid", name: "author_id" })
  authorId!: string;

  /** the take it speaks of */
  @Column({ type: "uuid", name: "hand_in_id", nullable: true })
  handInId!: string | null;

  @Column({ type: "double precision", name: "at_s", nullable: true })
  atS!: number | null;

  @Column({ type: "text" })
  text!: string;

  @Column({ type: "timestamptz", name: "created_at", default: () => "now()" })
  createdAt!: Date;
}
