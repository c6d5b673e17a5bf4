import { Column, Entity } from "typeorm";
import type { Voice } from "../../shared/contract/voice";
import { isoInstant, OwnedEntity } from "../database/owned.entity";

@Entity("voices")
export class VoiceEntity extends OwnedEntity implements Voice {
  @Column({ type: "text" })
  name!: string;

  @Column({ type: "jsonb", name: "by_hand", nullable: true })
  byHand!: Voice["byHand"];

  @Column({ type: "timestamptz", name: "created_at", transformer: isoInstant })
  createdAt!: string;
}
