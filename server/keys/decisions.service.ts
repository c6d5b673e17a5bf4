import type { DataSource, EntityManager } from "typeorm";
import type { Decision } from "../../shared/contract/decision";
import { withHistory } from "../../shared/contract/decisionHistory";
import { OwnedCollection } from "../http/ownedCollection.service";
import { DecisionEntity } from "./decision.entity";

/** One decision for each song and voice: a new one takes the place of the old and keeps its history. */
export function decisionsOf(dataSource: DataSource) {
  return new OwnedCollection<Decision, DecisionEntity>(dataSource, DecisionEntity, {
    noun: "decision",
    beforeSave: async ({ manager, userId, item, kept }) => {
      const { id, songId, voiceId } = item;
      const others = await manager
        .createQueryBuilder(DecisionEntity, "other")
        .where("other.userId = :userId AND other.songId = :songId AND other.id <> :id", { userId, songId, id })
        .andWhere("other.voiceId IS NOT DISTINCT FROM CAST(:voiceId AS uuid)", { voiceId })
        .getMany();
      if (others.length > 0) await manager.remove(others);
      const sameSinger = kept?.songId === songId && kept.voiceId === voiceId ? [kept] : [];
      return [...sameSinger, ...others].reduce(withHistory, item);
    },
  });
}

/** Before a voice goes: its decisions become everybody's, except where a song has one for everybody already. */
export async function dropDoubleDecisions(manager: EntityManager, userId: string, voiceId: string): Promise<void> {
  await manager.query(
    `DELETE FROM decisions AS own WHERE own.user_id = $1 AND own.voice_id = $2 AND EXISTS (
       SELECT FROM decisions AS shared
       WHERE shared.user_id = $1 AND shared.song_id = own.song_id AND shared.voice_id IS NULL)`,
    [userId, voiceId],
  );
}
