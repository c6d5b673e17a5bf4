import type { DataSource } from "typeorm";
import type { Decision } from "../../shared/contract/decision";
import { OwnedCollection } from "../http/ownedCollection.service";
import { DecisionEntity } from "./decision.entity";

/** One decision for each song: a new one takes the place of the old. */
export function decisionsOf(dataSource: DataSource) {
  return new OwnedCollection<Decision, DecisionEntity>(dataSource, DecisionEntity, {
    noun: "decision",
    beforeSave: async ({ manager, userId, item }) => {
      const { id, songId } = item;
      await manager
        .createQueryBuilder()
        .delete()
        .from(DecisionEntity)
        .where("user_id = :userId AND song_id = :songId AND id <> :id", { userId, songId, id })
        .execute();
      return item;
    },
  });
}
