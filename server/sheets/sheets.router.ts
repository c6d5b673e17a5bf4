import type { RequestHandler } from "express";
import type { DataSource } from "typeorm";
import {
  madeSheetLink,
  sharedSheet,
  sheetLink,
  sheetLinkQuery,
  sheetLinkRequest,
} from "../../shared/contract/sheetLink";
import type { Api } from "../http/api";
import { currentUserId } from "../http/currentUser";
import { idIn } from "../http/ownedCollection.router";
import { parse } from "../http/parse";
import { TryBucket } from "../http/tryBucket";
import { SheetLinksService } from "./sheetLinks.service";

const openedInAMinute = 120;
const madeInAnHour = 60;

/** Nothing of what is shared by a link belongs into a search engine. */
const notIndexed = { "X-Robots-Tag": "noindex, nofollow", "Referrer-Policy": "no-referrer" };

/** Read-only links to sheets: made, listed and ended by their owner, opened by anybody who has one. */
export function sheetsRoutes(api: Api, dataSource: DataSource): void {
  const links = new SheetLinksService(dataSource);
  const opening = new TryBucket(dataSource, "shared-sheet", openedInAMinute, 60);
  const making = new TryBucket(dataSource, "sheet-link", madeInAnHour, 3600);
  const tooMany = { description: "Asked too often (too-many-tries); Retry-After tells the seconds to wait." };
  const own = { tag: "sheets", signedIn: true } as const;

  api.route(
    {
      ...own,
      method: "get",
      path: "/sheet-links",
      summary: "Links to sheets of this account, newest first, ended ones included",
      query: sheetLinkQuery,
      answers: { 200: { description: "The links.", schema: { name: "SheetLink", schema: sheetLink }, list: true } },
    },
    async (req, res) => {
      const { songId } = parse(sheetLinkQuery, req.query, "This cannot be asked for.");
      res.json(await links.list(currentUserId(res), songId));
    },
  );
  api.route(
    {
      ...own,
      method: "post",
      path: "/sheet-links",
      summary: "Make a link that opens a sheet without an account; its address is told only now",
      body: { name: "SheetLinkRequest", schema: sheetLinkRequest },
      answers: {
        201: { description: "Made.", schema: { name: "MadeSheetLink", schema: madeSheetLink } },
        409: { description: "This account holds as many links as it may (collection-full)." },
        429: tooMany,
      },
    },
    async (req, res) => {
      const request = parse(sheetLinkRequest, req.body);
      await making.take(currentUserId(res));
      res.status(201).json(await links.make(currentUserId(res), request));
    },
  );
  api.route(
    {
      ...own,
      method: "delete",
      path: "/sheet-links/:id",
      summary: "End a link at once; it stays in the list",
      answers: { 204: { description: "Ended." }, 404: { description: "There is no such link in this account." } },
    },
    async (req, res) => {
      await links.revoke(currentUserId(res), idIn(req.params, "id", "link"));
      res.status(204).end();
    },
  );
  api.route(
    {
      method: "get",
      path: "/shared/:token",
      tag: "sheets",
      summary: "What a link shows: title and chart of the song as they are now, and the key it was shared in",
      signedIn: false,
      answers: {
        200: { description: "The sheet.", schema: { name: "SharedSheet", schema: sharedSheet } },
        404: { description: "There is no such link, or its song is gone (not-found)." },
        410: { description: "The link has ended (link-expired, link-revoked)." },
        429: tooMany,
      },
    },
    async (req, res) => {
      res.set(notIndexed);
      await opening.take(req.ip ?? "");
      res.json(await links.open(req.params.token ?? ""));
    },
  );
}

/** Pages that show a link say by their status too whether it still stands. */
export function sharedPages(dataSource: DataSource): RequestHandler {
  const links = new SheetLinksService(dataSource);
  return async (req, res, next) => {
    res.set(notIndexed);
    res.locals.pageStatus = await links.statusOf(req.path.split("/")[1] ?? "");
    next();
  };
}
