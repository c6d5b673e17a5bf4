import { Column, Entity } from "typeorm";
import type { LineUp } from "../../shared/contract/lineUp";
import { isoInstant, OwnedEntity } from "../database/owned.entity";

@Entity("line_ups")
export class LineUpEntity extends OwnedEntity implements LineUp {
  @Column({ type: "uuid", name: "song_id" })
  songId!: string;

  @Column({ type: "jsonb" })
  players!: LineUp["players"];

  @Column({ type: "timestamptz", name: "changed_at", transformer: isoInstant })
  changedAt!: string;
}
