import { Column, Entity } from "typeorm";
import type { Arrangement } from "../../shared/contract/arrangement";
import { isoInstant, OwnedEntity } from "../database/owned.entity";

@Entity("arrangements")
export class ArrangementEntity extends OwnedEntity implements Arrangement {
  @Column({ type: "uuid", name: "song_id" })
  songId!: string;

  @Column({ type: "text" })
  name!: string;

  @Column({ type: "text" })
  tonic!: string;

  @Column({ type: "smallint" })
  shift!: number;

  @Column({ type: "text" })
  instrument!: string;

  @Column({ type: "jsonb" })
  way!: Arrangement["way"];

  @Column({ type: "jsonb" })
  chords!: Arrangement["chords"];

  @Column({ type: "jsonb" })
  pattern!: Arrangement["pattern"];

  @Column({ type: "timestamptz", name: "created_at", transformer: isoInstant })
  createdAt!: string;
}
