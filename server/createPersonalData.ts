import type { DataSource } from "typeorm";
import { arrangementsOf } from "./arrangements/arrangements.service";
import { fileName, type PersonalDataPart } from "./auth/personalData.service";
import { instrumentsOf } from "./instruments/instruments.service";
import { decisionsOf } from "./keys/decisions.service";
import { triesOf } from "./keys/tries.service";
import { lineUpsOf } from "./lineUps/lineUps.service";
import { LinkTokensService } from "./mail/linkTokens.service";
import { MailPreferencesService } from "./mail/mailPreferences.service";
import { SheetLinksService } from "./sheets/sheetLinks.service";
import { SongVersionsService } from "./songs/songVersions.service";
import { songsOf } from "./songs/songs.service";
import { GuardiansService } from "./studio/consent/guardians.service";
import { studioDataOf } from "./studio/studioData.service";
import { StudioAccessService } from "./studio/studioAccess.service";
import { StudiosService } from "./studio/studios.service";
import { playerWishesOf } from "./ways/playerWishes.service";
import type { ObjectStore } from "./storage/objectStore.service";
import { HandedInTakes } from "./studio/handIns/handedInTakes.service";
import { takesOf, voicesOf } from "./voices/voices.service";

/**
 * What every domain keeps of a person: goes into the export, and is erased with the account. A new domain adds its part
 * here; one that keeps files outside the database gives it an `erase` as well.
 */
export function createPersonalData(
  dataSource: DataSource,
  { tokenSecret, objects }: { tokenSecret: string; objects: ObjectStore },
): PersonalDataPart[] {
  const preferences = new MailPreferencesService(dataSource, tokenSecret);
  const studios = new StudiosService(dataSource, new StudioAccessService(dataSource));
  const guardians = new GuardiansService(dataSource, new LinkTokensService(tokenSecret));
  const versions = new SongVersionsService(dataSource);
  return [
    {
      name: "account",
      files: async (userId) => ({
        "account.json": await dataSource.query(
          `SELECT id, email, role, created_at, confirmed_at, erase_at, birth_year, country FROM users WHERE id = $1`,
          [userId],
        ),
        "sessions.json": await dataSource.query(
          "SELECT id, device, created_at, last_used_at, expires_at, revoked_at FROM sessions WHERE user_id = $1",
          [userId],
        ),
        "mails.json": await dataSource.query("SELECT kind, state, at FROM sent_mails WHERE user_id = $1", [userId]),
        "mail-preferences.json": await preferences.get(userId),
        "security-events.json": await dataSource.query(
          "SELECT at, what, address_hash FROM security_events WHERE user_id = $1 ORDER BY id",
          [userId],
        ),
      }),
    },
    {
      name: "voices",
      files: async (userId) => ({
        "voices.json": await voicesOf(dataSource).list(userId),
        "takes.json": await takesOf(dataSource).list(userId),
      }),
    },
    {
      name: "songs",
      files: async (userId) => {
        const songs = await songsOf(dataSource).list(userId);
        const charts = songs.map(({ id, title, chart }) => [`charts/${fileName(title, id)}.txt`, chart]);
        const earlier: Record<string, unknown> = {};
        for (const { id } of songs) {
          const entries = await versions.list(userId, id);
          if (entries.length === 0) continue;
          earlier[`versions/${id}.json`] = await Promise.all(
            entries.map((entry) => versions.get(userId, id, entry.id)),
          );
        }
        return { "songs.json": songs, ...Object.fromEntries(charts), ...earlier };
      },
    },
    {
      name: "keys",
      files: async (userId) => ({
        "decisions.json": await decisionsOf(dataSource).list(userId),
        "tries.json": await triesOf(dataSource).list(userId),
      }),
    },
    {
      name: "sheets",
      files: async (userId) => ({ "links.json": await new SheetLinksService(dataSource).list(userId, undefined) }),
    },
    {
      name: "line-ups",
      files: async (userId) => ({ "line-ups.json": await lineUpsOf(dataSource).list(userId) }),
    },
    {
      name: "arrangements",
      files: async (userId) => ({ "arrangements.json": await arrangementsOf(dataSource).list(userId) }),
    },
    {
      name: "ways",
      files: async (userId) => ({ "wishes.json": await playerWishesOf(dataSource).list(userId) }),
    },
    {
      name: "studio",
      files: (userId) => studioDataOf(dataSource, userId),
      erase: async (userId) => {
        await studios.passOn(userId);
        await guardians.forget(userId);
      },
    },
    {
      name: "instruments",
      files: async (userId) => ({ "instruments.json": await instrumentsOf(dataSource).list(userId) }),
    },
    new HandedInTakes(dataSource, objects),
  ];
}
