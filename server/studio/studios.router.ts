import { memberChange, newStudio, studio, studioChange } from "../../shared/contract/studio/studio";
import type { Api } from "../http/api";
import { currentUserId } from "../http/currentUser";
import { idIn } from "../http/ownedCollection.router";
import { parse } from "../http/parse";
import { forMembers, missingStudio, ownerOnly, studioIdIn } from "./studioAnswers";
import type { StudioParts } from "./studioParts";

const studioSchema = { name: "Studio", schema: studio };

/** Studios and the people in them. */
export function studiosRoutes(api: Api, { studios, members }: StudioParts): void {
  api.route(
    {
      ...forMembers,
      method: "get",
      path: "/studios",
      summary: "The studios that one teaches or is a pupil in, newest first",
      answers: { 200: { description: "The studios.", schema: studioSchema, list: true } },
    },
    async (_req, res) => {
      res.json(await studios.list(currentUserId(res)));
    },
  );

  api.route(
    {
      ...forMembers,
      method: "post",
      path: "/studios",
      summary: "Open a studio and own it; a singer's account becomes a teacher's",
      body: { name: "NewStudio", schema: newStudio },
      answers: {
        201: { description: "Opened.", schema: studioSchema },
        409: { description: "This account holds as many studios as it may (collection-full)." },
      },
    },
    async (req, res) => {
      res.status(201).json(await studios.make(currentUserId(res), parse(newStudio, req.body)));
    },
  );

  api.route(
    {
      ...forMembers,
      method: "get",
      path: "/studios/:id",
      summary: "One studio, as a member of it sees it",
      answers: { 200: { description: "The studio.", schema: studioSchema }, 404: missingStudio },
    },
    async (req, res) => {
      res.json(await studios.get(currentUserId(res), studioIdIn(req.params)));
    },
  );

  api.route(
    {
      ...forMembers,
      method: "put",
      path: "/studios/:id",
      summary: "Change name and event, for its teachers; and for its owner how long recordings are kept",
      body: { name: "StudioChange", schema: studioChange },
      answers: {
        200: { description: "Saved.", schema: studioSchema },
        403: { description: "Not a teacher (teachers-only), or other days and not the owner (owner-only)." },
        404: missingStudio,
      },
    },
    async (req, res) => {
      const wanted = parse(studioChange, req.body);
      res.json(await studios.change(currentUserId(res), studioIdIn(req.params), wanted));
    },
  );

  api.route(
    {
      ...forMembers,
      method: "delete",
      path: "/studios/:id",
      summary: "Delete a studio with its assignments, threads and takes; pupils keep the songs on their shelves",
      answers: { 204: { description: "Deleted." }, 403: ownerOnly, 404: missingStudio },
    },
    async (req, res) => {
      await studios.remove(currentUserId(res), studioIdIn(req.params));
      res.status(204).end();
    },
  );

  api.route(
    {
      ...forMembers,
      method: "put",
      path: "/studios/:id/members/:memberId",
      summary: "Change one's own name there; as the owner also somebody's role, or pass the studio on",
      body: { name: "MemberChange", schema: memberChange },
      answers: {
        200: { description: "The studio after it.", schema: studioSchema },
        403: { description: "Not one's own name (own-name-only), or a role and not the owner (owner-only)." },
        404: { description: "There is no such member, or one may not know of them." },
        409: { description: "The owner stays (owner-stays); only a teacher can become the owner (not-a-teacher)." },
      },
    },
    async (req, res) => {
      const wanted = parse(memberChange, req.body);
      const userId = currentUserId(res);
      const studioId = studioIdIn(req.params);
      await members.change(userId, studioId, idIn(req.params, "memberId", "member"), wanted);
      res.json(await studios.get(userId, studioId));
    },
  );

  api.route(
    {
      ...forMembers,
      method: "delete",
      path: "/studios/:id/members/:memberId",
      summary: "Leave, or as a teacher remove somebody; at once teachers see nothing of them any more",
      answers: {
        204: { description: "Gone." },
        404: { description: "There is no such member, or one may not know of them." },
        409: { description: "The owner stays (owner-stays)." },
      },
    },
    async (req, res) => {
      await members.remove(currentUserId(res), studioIdIn(req.params), idIn(req.params, "memberId", "member"));
      res.status(204).end();
    },
  );
}
