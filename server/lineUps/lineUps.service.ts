import type { DataSource } from "typeorm";
import type { LineUp } from "../../shared/contract/lineUp";
import { OwnedCollection } from "../http/ownedCollection.service";
import { LineUpEntity } from "./lineUp.entity";

/** One line-up for each song: a new one takes the place of the old. */
export function lineUpsOf(dataSource: DataSource) {
  return new OwnedCollection<LineUp, LineUpEntity>(dataSource, LineUpEntity, {
    noun: "line-up",
    mostItems: 5000,
    beforeSave: async ({ manager, userId, item }) => {
      await manager
        .createQueryBuilder()
        .delete()
        .from(LineUpEntity)
        .where("user_id = :userId AND song_id = :songId AND id <> :id", { userId, songId: item.songId, id: item.id })
        .execute();
      return item;
    },
  });
}
