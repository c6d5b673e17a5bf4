import { comment, commentRequest, part, partChange, partListing } from "../../../shared/contract/studio/assignment";
import type { Api } from "../../http/api";
import { currentUserId } from "../../http/currentUser";
import { idIn } from "../../http/ownedCollection.router";
import { parse } from "../../http/parse";
import { forMembers } from "../studioAnswers";
import type { StudioParts } from "../studioParts";

const partSchema = { name: "Part", schema: part };
const commentSchema = { name: "Comment", schema: comment };
const missing = { description: "There is no such part, or it is neither one's own nor in a studio one teaches in." };
const notAgreed = { description: "The pupil does not agree at present that teachers see this (not-agreed)." };
const partIdIn = (params: Record<string, string>) => idIn(params, "id", "part");

/** One pupil's part of an assignment, for the pupil and for the teachers, and its thread. */
export function partsRoutes(api: Api, { parts, comments }: StudioParts): void {
  api.route(
    {
      ...forMembers,
      method: "get",
      path: "/parts",
      summary: "What I was given, in all my studios, newest first",
      answers: {
        200: { description: "My parts.", schema: { name: "PartListing", schema: partListing }, list: true },
      },
    },
    async (_req, res) => {
      res.json(await parts.mine(currentUserId(res)));
    },
  );

  api.route(
    {
      ...forMembers,
      method: "get",
      path: "/parts/:id",
      summary: "One part: the song, the key and way, notes and state",
      answers: { 200: { description: "The part.", schema: partSchema }, 404: missing },
    },
    async (req, res) => {
      res.json(await parts.get(currentUserId(res), partIdIn(req.params)));
    },
  );

  api.route(
    {
      ...forMembers,
      method: "put",
      path: "/parts/:id",
      summary: "As a teacher: another key, way or note, or the answer to what was handed in (the pupil gets a mail)",
      body: { name: "PartChange", schema: partChange },
      answers: {
        200: { description: "Saved.", schema: partSchema },
        403: { description: "Not a teacher there (teachers-only), or the pupil does not agree (not-agreed)." },
        404: missing,
        409: { description: "A take was handed in after the one that was seen (newer-take)." },
      },
    },
    async (req, res) => {
      const wanted = parse(partChange, req.body);
      res.json(await parts.change(currentUserId(res), partIdIn(req.params), wanted));
    },
  );

  api.route(
    {
      ...forMembers,
      method: "get",
      path: "/parts/:id/comments",
      summary: "The thread of a part, oldest first",
      answers: {
        200: { description: "The comments.", schema: commentSchema, list: true },
        403: notAgreed,
        404: missing,
      },
    },
    async (req, res) => {
      res.json(await comments.list(currentUserId(res), partIdIn(req.params)));
    },
  );

  api.route(
    {
      ...forMembers,
      method: "post",
      path: "/parts/:id/comments",
      summary: "Write into the thread; with a take and a time, if the words stand there. May be repeated by its id",
      body: { name: "CommentRequest", schema: commentRequest },
      answers: {
        201: { description: "Written.", schema: commentSchema },
        403: notAgreed,
        404: missing,
        409: { description: "The thread holds as much as it may (collection-full), or the id is taken (conflict)." },
      },
    },
    async (req, res) => {
      const wanted = parse(commentRequest, req.body);
      res.status(201).json(await comments.add(currentUserId(res), partIdIn(req.params), wanted));
    },
  );

  api.route(
    {
      ...forMembers,
      method: "delete",
      path: "/parts/:id/comments/:commentId",
      summary: "Take back what one wrote oneself",
      answers: {
        204: { description: "Removed." },
        404: { description: "There is no such comment of one's own (not-found)." },
      },
    },
    async (req, res) => {
      const commentId = idIn(req.params, "commentId", "comment");
      await comments.remove(currentUserId(res), partIdIn(req.params), commentId);
      res.status(204).end();
    },
  );
}
