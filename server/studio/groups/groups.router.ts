import { groupKey, groupRequest, studioGroup } from "../../../shared/contract/studio/group";
import type { Api } from "../../http/api";
import { currentUserId } from "../../http/currentUser";
import { idIn } from "../../http/ownedCollection.router";
import { parse } from "../../http/parse";
import { forMembers, missingStudio, studioIdIn, teachersOnly } from "../studioAnswers";
import type { StudioParts } from "../studioParts";

const group = { name: "StudioGroup", schema: studioGroup };
const request = { name: "GroupRequest", schema: groupRequest };
const missing = { description: "There is no such group (not-found)." };
const groupIdIn = (params: Record<string, string>) => idIn(params, "groupId", "group");

/** Groups of pupils, and the one key that a group sings a song in; for teachers. */
export function groupsRoutes(api: Api, { groups }: StudioParts): void {
  api.route(
    {
      ...forMembers,
      method: "get",
      path: "/studios/:id/groups",
      summary: "The groups of a studio with their keys, oldest first",
      answers: {
        200: { description: "The groups.", schema: group, list: true },
        403: teachersOnly,
        404: missingStudio,
      },
    },
    async (req, res) => {
      res.json(await groups.list(currentUserId(res), studioIdIn(req.params)));
    },
  );

  api.route(
    {
      ...forMembers,
      method: "post",
      path: "/studios/:id/groups",
      summary: "Make a group of pupils",
      body: request,
      answers: {
        201: { description: "Made.", schema: group },
        403: teachersOnly,
        404: missingStudio,
        409: { description: "The studio has as many groups as it may (collection-full)." },
      },
    },
    async (req, res) => {
      const wanted = parse(groupRequest, req.body);
      res.status(201).json(await groups.make(currentUserId(res), studioIdIn(req.params), wanted));
    },
  );

  api.route(
    {
      ...forMembers,
      method: "put",
      path: "/studios/:id/groups/:groupId",
      summary: "Change a group's name and who is in it; its keys stay",
      body: request,
      answers: { 200: { description: "Saved.", schema: group }, 403: teachersOnly, 404: missing },
    },
    async (req, res) => {
      const wanted = parse(groupRequest, req.body);
      res.json(await groups.change(currentUserId(res), studioIdIn(req.params), groupIdIn(req.params), wanted));
    },
  );

  api.route(
    {
      ...forMembers,
      method: "delete",
      path: "/studios/:id/groups/:groupId",
      summary: "Delete a group; the pupils stay in the studio",
      answers: { 204: { description: "Deleted." }, 403: teachersOnly, 404: missing },
    },
    async (req, res) => {
      await groups.remove(currentUserId(res), studioIdIn(req.params), groupIdIn(req.params));
      res.status(204).end();
    },
  );

  api.route(
    {
      ...forMembers,
      method: "put",
      path: "/studios/:id/groups/:groupId/key",
      summary: "Keep the key of the group for a song, with each pupil's way; takes the place of the one before",
      body: { name: "GroupKey", schema: groupKey },
      answers: { 200: { description: "Saved.", schema: group }, 403: teachersOnly, 404: missing },
    },
    async (req, res) => {
      const key = parse(groupKey, req.body);
      res.json(await groups.setKey(currentUserId(res), studioIdIn(req.params), groupIdIn(req.params), key));
    },
  );
}
