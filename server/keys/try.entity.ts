import { Column, Entity } from "typeorm";
import type { Try } from "../../shared/contract/try";
import { absentAsNull, isoInstant, OwnedEntity } from "../database/owned.entity";

@Entity("song_tries")
export class TryEntity extends OwnedEntity implements Try {
  @Column({ type: "uuid", name: "song_id" })
  songId!: string;

  @Column({ type: "uuid", name: "voice_id", nullable: true })
  voiceId!: string | null;

  @Column({ type: "text" })
  tonic!: string;

  @Column({ type: "smallint" })
  shift!: number;

  @Column({ type: "double precision", nullable: true, transformer: absentAsNull })
  tempo?: number;

  @Column({ type: "boolean" })
  backing!: boolean;

  @Column({ type: "timestamptz", name: "sung_at", transformer: isoInstant })
  sungAt!: string;

  @Column({ type: "smallint", nullable: true })
  effort!: number | null;

  @Column({ type: "jsonb", nullable: true })
  measures!: Try["measures"];
}
