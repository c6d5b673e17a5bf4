import type { DataSource } from "typeorm";
import type { Song } from "../../shared/contract/song";
import { OwnedCollection } from "../http/ownedCollection.service";
import { SongEntity } from "./song.entity";

export function songsOf(dataSource: DataSource) {
  return new OwnedCollection<Song, SongEntity>(dataSource, SongEntity, { noun: "song" });
}
