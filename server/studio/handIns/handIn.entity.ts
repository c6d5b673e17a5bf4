import { Column, Entity, PrimaryColumn } from "typeorm";
import type { HandIn } from "../../../shared/contract/studio/handIn";

@Entity("hand_ins")
export class HandInEntity {
  @PrimaryColumn({ type: "uuid" })
  id!: string;

  @Column({ type: "uuid", name: "part_id" })
  partId!: string;

  /** the member who recorded it */
  @Column({ type: "uuid", name: "author_id" })
  authorId!: string;

  /** as the device knows it that recorded it; null for an answer, and once the recording is deleted */
  @Column({ type: "uuid", name: "take_id", nullable: true })
  takeId!: string | null;

  @Column({ type: "text" })
  kind!: HandIn["kind"];

  @Column({ type: "text", name: "storage_key" })
  storageKey!: string;

  /** as found in its bytes; null until they are there */
  @Column({ type: "text", name: "media_type", nullable: true })
  mediaType!: string | null;

  @Column({ type: "integer" })
  bytes!: number;

  @Column({ type: "double precision", name: "duration_s" })
  durationS!: number;

  @Column({ type: "smallint", nullable: true })
  effort!: number | null;

  @Column({ type: "jsonb", nullable: true })
  measures!: HandIn["measures"];

  @Column({ type: "jsonb", nullable: true })
  picture!: HandIn["picture"];

  @Column({ type: "text" })
  state!: HandIn["state"];

  @Column({ type: "timestamptz", name: "created_at", default: () => "now()" })
  createdAt!: Date;

  /** when its last byte was there */
  @Column({ type: "timestamptz", name: "ready_at", nullable: true })
  readyAt!: Date | null;

  @Column({ type: "timestamptz", name: "expires_at" })
  expiresAt!: Date;
}
