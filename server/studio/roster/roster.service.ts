import type { DataSource } from "typeorm";
import type { OwnInstrument } from "../../../shared/contract/instrument";
import type { PlayerWishes } from "../../../shared/contract/playerWishes";
import type { RosterRow } from "../../../shared/contract/studio/roster";
import type { Song } from "../../../shared/contract/song";
import type { StudioRole } from "../../../shared/contract/studio/studio";
import { tuneSpan } from "../../../shared/songs/tuneSpan";
import { InstrumentEntity } from "../../instruments/instrument.entity";
import { PlayerWishesEntity } from "../../ways/playerWishes.entity";
import { consentColumns, type ConsentRow, splitConsent } from "../consent/memberConsent";
import { tellsHowItFelt } from "../handIns/takeDeletion";
import type { StudioAccessService } from "../studioAccess.service";
import { rosterWarnings, type SungEffort } from "./rosterWarnings";
import { SharedVoicesService } from "./sharedVoices.service";

type Member = Pick<RosterRow, "memberId" | "name" | "groupIds" | "consent"> & {
  userId: string;
  role: StudioRole;
  joinedAt: Date;
};

interface OpenRow {
  memberId: string;
  partId: string;
  assignmentId: string;
  title: string;
  tonic: string;
  shift: number;
  dueOn: string | null;
  openCount: number;
}

const shownOpen = 3;

/** The table of everybody in a studio: all that teachers may see, a question or two for each kind and none for each pupil. */
export class RosterService {
  private readonly voices: SharedVoicesService;

  constructor(
    private readonly dataSource: DataSource,
    private readonly access: StudioAccessService,
  ) {
    this.voices = new SharedVoicesService(dataSource);
  }

  /** By name. */
  async rows(userId: string, studioId: string): Promise<RosterRow[]> {
    await this.access.teacher(userId, studioId);
    const members = await this.members(studioId);
    const sharing = members.filter(({ consent }) => consent.shares);
    const people = sharing.map((member) => member.userId);
    const [voices, instruments, wishes, open, efforts, waiting] = await Promise.all([
      this.voices.of(people),
      this.instruments(people),
      this.wishes(people),
      this.open(studioId),
      this.efforts(studioId),
      this.waiting(studioId),
    ]);
    return members.map(({ userId: person, joinedAt, ...member }): RosterRow => {
      const row = { ...member, joinedAt: joinedAt.toISOString() };
      if (!member.consent.shares) return { ...row, ...nothing };
      const voice = voices.get(person) ?? null;
      const sung = efforts.get(member.memberId) ?? [];
      const [last] = sung;
      const given = open.get(member.memberId) ?? [];
      return {
        ...row,
        voice,
        instrument: instruments.get(person) ?? null,
        wishes: wishes.get(person) ?? null,
        open: given.map(({ memberId: _member, openCount: _count, ...each }) => each),
        openCount: given[0]?.openCount ?? 0,
        lastTake: last ? { at: last.at.toISOString(), effort: last.effort } : null,
        waiting: waiting.get(member.memberId) ?? 0,
        warnings: rosterWarnings(sung, voice?.changing ?? false),
      };
    });
  }

  private async members(studioId: string): Promise<Member[]> {
    const rows: (Omit<Member, "consent"> & ConsentRow)[] = await this.dataSource.query(
      `SELECT m.id AS "memberId", m.user_id AS "userId", m.name, m.role, m.joined_at AS "joinedAt", ${consentColumns},
              ARRAY(SELECT g.group_id FROM studio_group_members g WHERE g.studio_id = m.studio_id AND g.member_id = m.id
                    ORDER BY g.group_id) AS "groupIds"
       FROM studio_members m JOIN users u ON u.id = m.user_id
       WHERE m.studio_id = $1 AND m.left_at IS NULL ORDER BY lower(m.name), m.id`,
      [studioId],
    );
    return rows.map((row) => splitConsent(row));
  }

  private async instruments(people: string[]): Promise<Map<string, OwnInstrument>> {
    if (people.length === 0) return new Map();
    const rows = await this.dataSource
      .createQueryBuilder(InstrumentEntity, "item")
      .select(
        ["id", "userId", "savedAt", "presetId", "name", "strings", "scaleMm", "frets", "fretMap", "capoTo"]
          .concat("leftHanded", "favourite")
          .map((column) => `item.${column}`),
      )
      .where("item.userId IN (:...people)", { people })
      .orderBy("item.favourite", "DESC")
      .addOrderBy("item.savedAt")
      .addOrderBy("item.id")
      .getMany();
    return firstOfEach(rows, ({ userId: _userId, savedAt: _savedAt, photo: _photo, ...item }) => item);
  }

  private async wishes(people: string[]) {
    if (people.length === 0) return new Map<string, Omit<PlayerWishes, "id" | "changedAt">>();
    const rows = await this.dataSource
      .createQueryBuilder(PlayerWishesEntity, "item")
      .where("item.userId IN (:...people)", { people })
      .orderBy("item.changedAt", "DESC")
      .getMany();
    return firstOfEach(rows, ({ id: _id, userId: _userId, savedAt: _savedAt, changedAt: _changedAt, ...item }) => item);
  }

  /** The newest open parts of each, with the notes of the tune as they sing it. */
  private async open(studioId: string) {
    const rows: OpenRow[] = await this.dataSource.query(
      `SELECT * FROM (
         SELECT p.member_id AS "memberId", p.id AS "partId", p.assignment_id AS "assignmentId",
                a.song->>'title' AS title, p.tonic, p.shift, a.due_on::text AS "dueOn",
                row_number() OVER of_member AS place, count(*) OVER (PARTITION BY p.member_id)::int AS "openCount"
         FROM assignment_parts p JOIN assignments a ON a.id = p.assignment_id
         WHERE p.studio_id = $1 AND p.state <> 'accepted'
         WINDOW of_member AS (PARTITION BY p.member_id ORDER BY a.created_at DESC, a.id)) newest
       WHERE place <= $2 ORDER BY "memberId", place`,
      [studioId, shownOpen],
    );
    const assignmentIds = [...new Set(rows.map(({ assignmentId }) => assignmentId))];
    const tunes: { id: string; tune: Song["tune"] }[] = await this.dataSource.query(
      "SELECT id, song->'tune' AS tune FROM assignments WHERE id = ANY($1)",
      [assignmentIds],
    );
    const spans = new Map(tunes.map(({ id, tune }) => [id, tuneSpan(tune)]));
    return ofEach(
      rows.map(({ memberId, partId, assignmentId, title, tonic, shift, dueOn, openCount }) => {
        const span = spans.get(assignmentId);
        const [lowMidi, highMidi] = span ? [span.lowMidi + shift, span.highMidi + shift] : [null, null];
        return { memberId, openCount, partId, assignmentId, title, tonic, dueOn, lowMidi, highMidi };
      }),
    );
  }

  /** The newest two takes of each that were handed in, newest first; also where only how it felt is left of one. */
  private async efforts(studioId: string): Promise<Map<string, SungEffort[]>> {
    const rows: (SungEffort & { memberId: string })[] = await this.dataSource.query(
      `SELECT "memberId", at, effort, strained FROM (
         SELECT p.member_id AS "memberId", h.created_at AS at, h.effort,
                h.measures#>>'{fellShort,side}' = 'above' AS strained,
                row_number() OVER (PARTITION BY p.member_id ORDER BY h.created_at DESC, h.id) AS place
         FROM hand_ins h JOIN assignment_parts p ON p.id = h.part_id
         WHERE p.studio_id = $1 AND h.kind = 'pupil-take' AND ${tellsHowItFelt}) newest
       WHERE place <= 2 ORDER BY "memberId", place`,
      [studioId],
    );
    return ofEach(rows);
  }

  private async waiting(studioId: string): Promise<Map<string, number>> {
    const rows: { memberId: string; waiting: number }[] = await this.dataSource.query(
      `SELECT member_id AS "memberId", count(*)::int AS waiting FROM assignment_parts
       WHERE studio_id = $1 AND state = 'handed-in' GROUP BY member_id`,
      [studioId],
    );
    return new Map(rows.map(({ memberId, waiting }) => [memberId, waiting]));
  }
}

const nothing = {
  voice: null,
  instrument: null,
  wishes: null,
  open: [],
  openCount: 0,
  lastTake: null,
  waiting: 0,
  warnings: [],
};

function ofEach<Row extends { memberId: string }>(rows: readonly Row[]): Map<string, Row[]> {
  const found = new Map<string, Row[]>();
  for (const row of rows) found.set(row.memberId, [...(found.get(row.memberId) ?? []), row]);
  return found;
}

function firstOfEach<Row extends { userId: string }, Shown>(rows: readonly Row[], show: (row: Row) => Shown) {
  const found = new Map<string, Shown>();
  for (const row of rows) if (!found.has(row.userId)) found.set(row.userId, show(row));
  return found;
}
