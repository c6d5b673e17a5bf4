import { randomUUID } from "node:crypto";
import type { DataSource, EntityManager } from "typeorm";
import type { Decision } from "../../../shared/contract/decision";
import type { GivenSong } from "../../../shared/contract/studio/assignment";
import { decisionsOf } from "../../keys/decisions.service";
import { songsOf } from "../../songs/songs.service";

/** How a pupil is to have a song. */
interface GivenKey {
  tonic: string;
  shift: number;
  score: number | null;
  reason: string;
  instrument: { id: string } | null;
  way: Decision["way"];
}

const longestTag = 40;
const longestReason = 300;

/** What an assignment puts on the pupil's own shelf: a copy of the song, and a key decided for it. */
export class PupilsCopyService {
  private readonly songs;
  private readonly decisions;

  constructor(private readonly dataSource: DataSource) {
    this.songs = songsOf(dataSource);
    this.decisions = decisionsOf(dataSource);
  }

  /** The id of the copy. It holds nothing of the teacher's account. */
  async give(manager: EntityManager, userId: string, song: GivenSong, studioName: string): Promise<string> {
    const id = randomUUID();
    const own = {
      ...{ demo: null, tags: [studioName.slice(0, longestTag).trim()], archivedAt: null, playedAt: null },
      ...{ createdAt: new Date().toISOString(), revision: 0 },
    };
    await this.songs.putIn(manager, userId, { ...song, ...own, id }, {});
    return id;
  }

  /** "My key" for the copy, in the voice that the pupil sang with last; what was decided before stays in its history. */
  async decide(manager: EntityManager, userId: string, songId: string, key: GivenKey): Promise<void> {
    const [voice]: { id: string }[] = await manager.query(
      `SELECT v.id FROM voices v LEFT JOIN takes t ON t.user_id = v.user_id AND t.voice_id = v.id
       WHERE v.user_id = $1 GROUP BY v.id ORDER BY coalesce(max(t.sung_at), v.created_at) DESC, v.id LIMIT 1`,
      [userId],
    );
    const { tonic, shift, score, way } = key;
    await this.decisions.putIn(
      manager,
      userId,
      {
        ...{ id: randomUUID(), songId, voiceId: voice?.id ?? null, tonic, shift, score, way },
        ...{ reason: key.reason.slice(0, longestReason), instrument: key.instrument?.id ?? null },
        ...{ decidedAt: new Date().toISOString(), earlier: [] },
      },
      {},
    );
  }
}
