import { Column, Entity } from "typeorm";
import type { Take } from "../../shared/contract/take";
import { isoInstant, OwnedEntity } from "../database/owned.entity";

@Entity("takes")
export class TakeEntity extends OwnedEntity implements Take {
  @Column({ type: "uuid", name: "voice_id" })
  voiceId!: string;

  @Column({ type: "text" })
  kind!: Take["kind"];

  @Column({ type: "text" })
  shows!: Take["shows"];

  @Column({ type: "timestamptz", name: "sung_at", transformer: isoInstant })
  sungAt!: string;

  @Column({ type: "boolean", name: "warmed_up", nullable: true })
  warmedUp!: boolean | null;

  @Column({ type: "smallint", nullable: true })
  effort!: number | null;

  @Column({ type: "double precision", name: "duration_s" })
  durationS!: number;

  @Column({ type: "jsonb" })
  range!: Take["range"];

  @Column({ type: "jsonb" })
  comfort!: Take["comfort"];

  @Column({ type: "jsonb" })
  estimate!: Take["estimate"];

  @Column({ type: "double precision", name: "tuning_cents" })
  tuningCents!: number;

  @Column({ type: "double precision" })
  certainty!: number;

  @Column({ type: "jsonb" })
  reasons!: string[];

  @Column({ type: "jsonb" })
  notes!: Take["notes"];
}
