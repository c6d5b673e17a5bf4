import { randomUUID } from "node:crypto";
import type { DataSource, EntityManager } from "typeorm";
import type { Decision } from "../../../shared/contract/decision";
import type { Song } from "../../../shared/contract/song";
import type { GivenSong } from "../../../shared/contract/studio/assignment";
import { HttpProblem } from "../../http/httpProblem";
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

interface Receiving {
  userId: string;
  key: GivenKey;
}

const longestTag = 40;
const longestReason = 300;

/** What an assignment puts on the pupils' own shelves: a copy of the song, and a key decided for it. */
export class PupilsCopyService {
  private readonly songs;
  private readonly decisions;

  constructor(dataSource: DataSource) {
    this.songs = songsOf(dataSource);
    this.decisions = decisionsOf(dataSource);
  }

  /** The ids of the copies, by account. They hold nothing of the teacher's. */
  async give(
    manager: EntityManager,
    song: GivenSong,
    studioName: string,
    pupils: readonly Receiving[],
  ): Promise<Map<string, string>> {
    const tags = [studioName.slice(0, longestTag).trim()];
    const createdAt = new Date().toISOString();
    const own = { demo: null, tags, archivedAt: null, playedAt: null, createdAt, revision: 0 };
    const copies = pupils.map(({ userId }) => ({ userId, item: { ...song, ...own, id: randomUUID() } satisfies Song }));
    await this.songs.addAll(manager, copies, {}).catch(inTheTeachersWords);
    const ids = new Map(copies.map(({ userId, item }) => [userId, item.id]));
    const voices = await voicesOf(manager, [...ids.keys()]);
    const decisions = pupils.flatMap(({ userId, key }) => {
      const songId = ids.get(userId);
      return songId === undefined ? [] : [{ userId, item: decision(songId, voices.get(userId) ?? null, key) }];
    });
    await this.decisions.addAll(manager, decisions, {});
    return ids;
  }

  /** Another key for a copy; what was decided before stays in its history. */
  async decide(manager: EntityManager, userId: string, songId: string, key: GivenKey): Promise<void> {
    const voices = await voicesOf(manager, [userId]);
    await this.decisions.putIn(manager, userId, decision(songId, voices.get(userId) ?? null, key), {});
  }
}

function decision(songId: string, voiceId: string | null, key: GivenKey): Decision {
  const { tonic, shift, score, way, instrument } = key;
  return {
    ...{ id: randomUUID(), songId, voiceId, tonic, shift, score, way, instrument: instrument?.id ?? null },
    ...{ reason: key.reason.slice(0, longestReason), decidedAt: new Date().toISOString(), earlier: [] },
  };
}

function inTheTeachersWords(error: unknown): never {
  if (error instanceof HttpProblem && error.code === "collection-full")
    throw new HttpProblem(409, error.code, "The shelf of one of them is full, so nobody was given the song.");
  throw error;
}

/** The voice that each sang with last. */
async function voicesOf(manager: EntityManager, people: readonly string[]): Promise<Map<string, string>> {
  const rows: { userId: string; id: string }[] = await manager.query(
    `SELECT DISTINCT ON (v.user_id) v.user_id AS "userId", v.id
     FROM voices v LEFT JOIN takes t ON t.user_id = v.user_id AND t.voice_id = v.id
     WHERE v.user_id = ANY($1) ORDER BY v.user_id, coalesce(t.sung_at, v.created_at) DESC, v.id`,
    [people],
  );
  return new Map(rows.map(({ userId, id }) => [userId, id]));
}
