import type { DataSource } from "typeorm";
import type { RosterRow } from "../../../shared/contract/studio/roster";
import { keyVoiceOf } from "../../../shared/keys/singingVoiceOf";
import { movingEnds } from "../../../shared/voice/movingEnds";
import { type KeptTake, shownTake } from "../../../shared/voice/shownTake";
import { VoiceEntity } from "../../voices/voice.entity";

type SharedVoice = NonNullable<RosterRow["voice"]>;

/** Takes of one voice beyond these tell nothing new. */
const mostTakes = 60;

/** The voice of each of many people, as their teachers see it: the one that was measured last. */
export class SharedVoicesService {
  constructor(private readonly dataSource: DataSource) {}

  async of(people: string[]): Promise<Map<string, SharedVoice>> {
    if (people.length === 0) return new Map();
    const voices = await this.dataSource
      .createQueryBuilder(VoiceEntity, "voice")
      .where("voice.userId IN (:...people)", { people })
      .orderBy("voice.createdAt", "DESC")
      .addOrderBy("voice.id")
      .getMany();
    const ofVoice = await this.takes(people);
    const found = new Map<string, { shared: SharedVoice; at: string }>();
    for (const voice of voices) {
      const own = ofVoice.get(voice.id) ?? [];
      const known = keyVoiceOf(voice, own);
      if (!known) continue;
      const measuredAt = voice.byHand ? null : (own[0]?.sungAt ?? null);
      const at = measuredAt ?? voice.createdAt;
      const other = found.get(voice.userId);
      if (other && other.at >= at) continue;
      const changing = !voice.byHand && movingEnds(own.map(shownTake)).length > 0;
      found.set(voice.userId, { at, shared: { voiceId: voice.id, name: voice.name, ...known, measuredAt, changing } });
    }
    return new Map([...found].map(([person, { shared }]) => [person, shared]));
  }

  /** By voice, newest first; without the notes, which are most of a take. */
  private async takes(people: string[]): Promise<Map<string, KeptTake[]>> {
    const rows: (Omit<KeptTake, "sungAt"> & { sungAt: Date })[] = await this.dataSource.query(
      `SELECT id, voice_id AS "voiceId", kind, shows, sung_at AS "sungAt", effort, range, comfort, estimate,
              tuning_cents AS "tuningCents", certainty
       FROM takes WHERE user_id = ANY($1) ORDER BY sung_at DESC, id`,
      [people],
    );
    const ofVoice = new Map<string, KeptTake[]>();
    for (const row of rows) {
      const known = ofVoice.get(row.voiceId) ?? [];
      if (known.length < mostTakes) known.push({ ...row, sungAt: row.sungAt.toISOString() });
      ofVoice.set(row.voiceId, known);
    }
    return ofVoice;
  }
}
