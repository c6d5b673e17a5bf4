import { Column, Entity } from "typeorm";
import type { Decision } from "../../shared/contract/decision";
import { isoInstant, OwnedEntity } from "../database/owned.entity";

@Entity("decisions")
export class DecisionEntity extends OwnedEntity implements Decision {
  @Column({ type: "uuid", name: "song_id" })
  songId!: string;

  @Column({ type: "uuid", name: "voice_id", nullable: true })
  voiceId!: string | null;

  @Column({ type: "text" })
  tonic!: string;

  @Column({ type: "smallint" })
  shift!: number;

  @Column({ type: "double precision", nullable: true })
  score!: number | null;

  @Column({ type: "text" })
  reason!: string;

  @Column({ type: "text", nullable: true })
  instrument!: string | null;

  @Column({ type: "jsonb", nullable: true })
  way!: Decision["way"];

  @Column({ type: "timestamptz", name: "decided_at", transformer: isoInstant })
  decidedAt!: string;

  @Column({ type: "jsonb" })
  earlier!: Decision["earlier"];
}
