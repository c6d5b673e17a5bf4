import { createHash, randomBytes, randomUUID } from "node:crypto";
import type { DataSource } from "typeorm";
import type { MadeSheetLink, SharedSheet, SheetLink, SheetLinkRequest } from "../../shared/contract/sheetLink";
import { HttpProblem, notFound } from "../http/httpProblem";
import { SongEntity } from "../songs/song.entity";
import { SheetLinkEntity } from "./sheetLink.entity";

/** 192 bits: nobody guesses one. */
const tokenBytes = 24;
const tokenForm = /^[A-Za-z0-9_-]{32}$/;
const mostLinks = 200;
const dayMs = 86_400_000;

const hashOf = (token: string) => createHash("sha256").update(token).digest();
const noLink = () => notFound("link");

/** Read-only links to sheets. Whoever has the address sees the song as it is now, until the link ends. */
export class SheetLinksService {
  constructor(private readonly dataSource: DataSource) {}

  async list(userId: string, songId: string | undefined): Promise<SheetLink[]> {
    const all = this.links("link").where("link.userId = :userId", { userId });
    if (songId !== undefined) all.andWhere("link.songId = :songId", { songId });
    const rows = await all.orderBy("link.createdAt", "DESC").addOrderBy("link.id").getMany();
    return rows.map(toLink);
  }

  /** The only time that the secret part of the address is known. */
  async make(userId: string, { songId, label, days, view }: SheetLinkRequest): Promise<MadeSheetLink> {
    const token = randomBytes(tokenBytes).toString("base64url");
    const now = Date.now();
    const link: SheetLink = {
      id: randomUUID(),
      songId: songId.toLowerCase(),
      label,
      view,
      createdAt: new Date(now).toISOString(),
      expiresAt: new Date(now + days * dayMs).toISOString(),
      revokedAt: null,
      openedAt: null,
    };
    await this.dataSource.transaction(async (manager) => {
      await manager.query("SELECT FROM users WHERE id = $1 FOR NO KEY UPDATE", [userId]);
      await manager.query("DELETE FROM sheet_links WHERE user_id = $1 AND expires_at < now() - interval '90 days'", [
        userId,
      ]);
      const kept = await manager
        .createQueryBuilder(SheetLinkEntity, "link")
        .where("link.userId = :userId", { userId })
        .getCount();
      if (kept >= mostLinks)
        throw new HttpProblem(409, "collection-full", `An account keeps at most ${mostLinks} links at a time.`);
      await manager
        .createQueryBuilder()
        .insert()
        .into(SheetLinkEntity)
        .values({ ...link, userId, tokenHash: hashOf(token) })
        .updateEntity(false)
        .execute();
    });
    return { link, token };
  }

  /** Ends a link; ending it again changes nothing. */
  async revoke(userId: string, id: string): Promise<void> {
    const { affected } = await this.dataSource
      .createQueryBuilder()
      .update(SheetLinkEntity)
      .set({ revokedAt: () => "coalesce(revoked_at, now())" })
      .where("user_id = :userId AND id = :id", { userId, id })
      .execute();
    if (!affected) throw noLink();
  }

  /** What a link shows; 404 for one that never was or whose song is gone, 410 for one that has ended. */
  async open(token: string): Promise<SharedSheet> {
    const link = await this.living(token);
    const song = await this.dataSource
      .createQueryBuilder(SongEntity, "song")
      .where("song.userId = :userId AND song.id = :songId", { userId: link.userId, songId: link.songId })
      .getOne();
    if (!song) throw noLink();
    await this.dataSource.query("UPDATE sheet_links SET opened_at = now() WHERE id = $1", [link.id]);
    const { title, chart, beatsPerBar, tempo, tune } = song;
    const writtenKey = song.writtenKey ?? (tune && { tonic: tune.home, mode: "major" as const });
    return { title, chart, writtenKey, beatsPerBar, tempo, view: link.view, expiresAt: link.expiresAt };
  }

  /** How a page that shows this link answers. */
  async statusOf(token: string): Promise<200 | 404 | 410> {
    try {
      await this.living(token);
      return 200;
    } catch (error) {
      if (error instanceof HttpProblem) return error.status === 410 ? 410 : 404;
      throw error;
    }
  }

  private async living(token: string): Promise<SheetLinkEntity> {
    if (!tokenForm.test(token)) throw noLink();
    const link = await this.links("link")
      .where("link.tokenHash = :hash", { hash: hashOf(token) })
      .getOne();
    if (!link) throw noLink();
    if (link.revokedAt !== null)
      throw new HttpProblem(410, "link-revoked", "Whoever shared this sheet has ended the link.");
    if (Date.parse(link.expiresAt) <= Date.now())
      throw new HttpProblem(410, "link-expired", "This link was made for a while, and that is over.");
    return link;
  }

  private links(alias: string) {
    return this.dataSource.createQueryBuilder(SheetLinkEntity, alias);
  }
}

function toLink({ userId: _userId, savedAt: _savedAt, tokenHash: _hash, ...link }: SheetLinkEntity): SheetLink {
  return link;
}
