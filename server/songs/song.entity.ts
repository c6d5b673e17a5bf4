import { Column, Entity } from "typeorm";
import type { Song } from "../../shared/contract/song";
import { isoInstant, isoInstantOrNull, OwnedEntity } from "../database/owned.entity";
import type { ListingColumns } from "./listingColumns";

@Entity("songs")
export class SongEntity extends OwnedEntity implements Song, ListingColumns {
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

  /** when its content last changed */
  @Column({ type: "timestamptz", name: "changed_at", default: () => "now()", select: false, update: false })
  changedAt!: Date;

  @Column({ type: "text", name: "title_key", select: false })
  titleKey!: string;

  @Column({ type: "text", array: true, name: "tag_keys", select: false })
  tagKeys!: string[];

  @Column({ type: "text", name: "search_text", select: false })
  searchText!: string;

  @Column({ type: "text", name: "first_words", select: false })
  firstWords!: string;

  @Column({ type: "jsonb", nullable: true, select: false })
  span!: ListingColumns["span"];
}
