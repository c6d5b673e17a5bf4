import { Column, Entity } from "typeorm";
import type { Song } from "../../shared/contract/song";
import { isoInstant, isoInstantOrNull, OwnedEntity } from "../database/owned.entity";

@Entity("songs")
export class SongEntity extends OwnedEntity implements Song {
  @Column({ type: "text" })
  title!: string;

  @Column({ type: "text" })
  chart!: string;

  @Column({ type: "jsonb", name: "written_key", nullable: true })
  writtenKey!: Song["writtenKey"];

  @Column({ type: "jsonb", nullable: true })
  tune!: Song["tune"];

  @Column({ type: "smallint", name: "beats_per_bar", nullable: true })
  beatsPerBar!: number | null;

  @Column({ type: "double precision", nullable: true })
  tempo!: number | null;

  @Column({ type: "text", nullable: true })
  demo!: string | null;

  @Column({ type: "text", array: true })
  tags!: string[];

  @Column({ type: "timestamptz", name: "archived_at", nullable: true, transformer: isoInstantOrNull })
  archivedAt!: string | null;

  @Column({ type: "timestamptz", name: "played_at", nullable: true, transformer: isoInstantOrNull })
  playedAt!: string | null;

  @Column({ type: "timestamptz", name: "created_at", transformer: isoInstant })
  createdAt!: string;

  @Column({ type: "integer" })
  revision!: number;
}
