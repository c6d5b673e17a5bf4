import type { DataSource } from "typeorm";
import type { PersonalDataPart } from "../../auth/personalData.service";
import type { ObjectStore } from "../../storage/objectStore.service";
import { soundEnding } from "./soundType";
import { TakeDeletion } from "./takeDeletion";

interface Kept {
  id: string;
  storageKey: string;
  mediaType: string | null;
}

const ofAuthor = "FROM hand_ins h JOIN studio_members m ON m.id = h.author_id WHERE m.user_id = $1";
const notRead = (ids: string[]) => `The storage did not answer, so the sound of these recordings is missing here.
They are still kept. Ask for your data again in a while.

${ids.join("\n")}
`;

/** What a person handed in or answered with: in the export with its sound, and gone from the storage with the account. */
export class HandedInTakes implements PersonalDataPart {
  readonly name = "handed-in";

  constructor(
    private readonly dataSource: DataSource,
    private readonly objects: ObjectStore,
  ) {}

  readonly files = async (userId: string): Promise<Record<string, unknown>> => ({
    "hand-ins.json": await this.dataSource.query(
      `SELECT h.id, h.part_id AS "partId", h.take_id AS "takeId", h.kind, h.media_type AS "mediaType", h.bytes,
              h.duration_s AS "durationS", h.effort, h.measures, h.picture, h.state,
              h.created_at AS "createdAt", h.expires_at AS "expiresAt"
       ${ofAuthor} ORDER BY h.created_at`,
      [userId],
    ),
  });

  async *large(userId: string): AsyncGenerator<[string, Uint8Array | string], void> {
    const kept: Kept[] = await this.dataSource.query(
      `SELECT h.id, h.storage_key AS "storageKey", h.media_type AS "mediaType"
       ${ofAuthor} AND h.state = 'ready' ORDER BY h.created_at`,
      [userId],
    );
    const unread: string[] = [];
    for (const { id, storageKey, mediaType } of kept) {
      // After one that could not be read, the others are not waited for.
      const sound = unread.length > 0 ? null : await this.objects.read(storageKey).catch(() => null);
      if (sound) yield [`takes/${id}.${soundEnding(mediaType)}`, sound];
      else unread.push(id);
    }
    if (unread.length > 0) yield ["not-read.txt", notRead(unread)];
  }

  readonly erase = (userId: string): Promise<void> => new TakeDeletion(this.dataSource, this.objects).erase(userId);
}
