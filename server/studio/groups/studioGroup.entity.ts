import { Column, Entity, PrimaryColumn } from "typeorm";
import type { GroupKey } from "../../../shared/contract/studio/group";

@Entity("studio_groups")
export class StudioGroupEntity {
  @PrimaryColumn({ type: "uuid" })
  id!: string;

  @Column({ type: "uuid", name: "studio_id" })
  studioId!: string;

  @Column({ type: "text" })
  name!: string;

  /** one for each song, newest first */
  @Column({ type: "jsonb" })
  keys!: GroupKey[];

  @Column({ type: "timestamptz", name: "created_at", default: () => "now()" })
  createdAt!: Date;
}
