import type { DataSource } from "typeorm";
import { song } from "../../shared/contract/song";
import type { Api } from "../http/api";
import { ownedCollectionRoutes } from "../http/ownedCollection.router";
import { songsOf } from "./songs.service";

export function songsRoutes(api: Api, dataSource: DataSource): void {
  const songs = { name: "Song", schema: song, plural: "songs", noun: "song", removes: "its decision" };
  ownedCollectionRoutes(api, songs, songsOf(dataSource));
}
