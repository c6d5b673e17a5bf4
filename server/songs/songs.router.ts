import type { DataSource } from "typeorm";
import { z } from "zod";
import { song } from "../../shared/contract/song";
import { songPage, songPageQuery, songTag } from "../../shared/contract/songListing";
import { songVersion, songVersionEntry } from "../../shared/contract/songVersion";
import type { Api } from "../http/api";
import { currentUserId } from "../http/currentUser";
import { idIn, ownedCollectionRoutes } from "../http/ownedCollection.router";
import { parse } from "../http/parse";
import { SongPagesService } from "./songPages.service";
import { songsOf } from "./songs.service";
import { SongVersionsService } from "./songVersions.service";

const common = { method: "get", tag: "songs", signedIn: true } as const;
const missing = { description: "There is no such song in this account." };

const songs = {
  name: "Song",
  schema: song,
  plural: "songs",
  noun: "song",
  removes: "its versions, decisions and tries",
  wishes: z.strictObject({
    version: z
      .enum(["0", "1"])
      .describe('"1" keeps the state before as a version, however young the newest one is: so with a restore.')
      .exactOptional(),
  }),
  refusals: {
    409: {
      description:
        "The revision is not the kept one and the content differs (changed-elsewhere), or the account is full (collection-full).",
    },
  },
};

/** Songs, in pages as well, and their earlier states. */
export function songsRoutes(api: Api, dataSource: DataSource): void {
  pageRoutes(api, new SongPagesService(dataSource));
  ownedCollectionRoutes(api, songs, songsOf(dataSource));
  versionRoutes(api, new SongVersionsService(dataSource));
}

function pageRoutes(api: Api, pages: SongPagesService): void {
  api.route(
    {
      ...common,
      path: "/songs/page",
      summary: "Songs in pages, searched and sorted, without charts and notes",
      query: songPageQuery,
      answers: { 200: { description: "A page.", schema: { name: "SongPage", schema: songPage } } },
    },
    async (req, res) => {
      const question = parse(songPageQuery, req.query, "This cannot be asked for.");
      res.json(await pages.page(currentUserId(res), question));
    },
  );
  api.route(
    {
      ...common,
      path: "/songs/tags",
      summary: "The tags of the songs that are not put aside, the most frequent first",
      answers: { 200: { description: "The tags.", schema: { name: "SongTag", schema: songTag }, list: true } },
    },
    async (_req, res) => {
      res.json(await pages.tags(currentUserId(res)));
    },
  );
}

function versionRoutes(api: Api, versions: SongVersionsService): void {
  const entry = { name: "SongVersionEntry", schema: songVersionEntry };
  api.route(
    {
      ...common,
      path: "/songs/:id/versions",
      summary: "Earlier states of a song, newest first",
      answers: { 200: { description: "The versions.", schema: entry, list: true }, 404: missing },
    },
    async (req, res) => {
      res.json(await versions.list(currentUserId(res), idIn(req.params, "id", "song")));
    },
  );
  api.route(
    {
      ...common,
      path: "/songs/:id/versions/:versionId",
      summary: "An earlier state of a song; to restore it, save its content with the revision of today",
      answers: {
        200: { description: "The version.", schema: { name: "SongVersion", schema: songVersion } },
        404: { description: "There is no such version in this account." },
      },
    },
    async (req, res) => {
      const [id, versionId] = [idIn(req.params, "id", "song"), idIn(req.params, "versionId", "version")];
      res.json(await versions.get(currentUserId(res), id, versionId));
    },
  );
}
