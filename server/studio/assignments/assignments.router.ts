import {
  assignment,
  assignmentChange,
  assignmentListing,
  assignmentRequest,
} from "../../../shared/contract/studio/assignment";
import type { Api } from "../../http/api";
import { currentUserId } from "../../http/currentUser";
import { idIn } from "../../http/ownedCollection.router";
import { parse } from "../../http/parse";
import { forMembers, missingStudio, studioIdIn, teachersOnly } from "../studioAnswers";
import type { StudioParts } from "../studioParts";

const assignmentSchema = { name: "Assignment", schema: assignment };
const missing = { description: "There is no such assignment (not-found)." };
const one = "/studios/:id/assignments/:assignmentId";
const idOf = (params: Record<string, string>) => idIn(params, "assignmentId", "assignment");

/** Songs given to many at once; for teachers. */
export function assignmentsRoutes(api: Api, { assignments }: StudioParts): void {
  api.route(
    {
      ...forMembers,
      method: "get",
      path: "/studios/:id/assignments",
      summary: "What was given in a studio, newest first, and how far it is",
      answers: {
        200: {
          description: "The assignments.",
          schema: { name: "AssignmentListing", schema: assignmentListing },
          list: true,
        },
        403: teachersOnly,
        404: missingStudio,
      },
    },
    async (req, res) => {
      res.json(await assignments.list(currentUserId(res), studioIdIn(req.params)));
    },
  );

  api.route(
    {
      ...forMembers,
      method: "post",
      path: "/studios/:id/assignments",
      summary:
        "Give a song of one's shelf to many, each in their own key: each gets a copy, a decided key and a mail. May be repeated by its id",
      body: { name: "AssignmentRequest", schema: assignmentRequest },
      answers: {
        201: { description: "Given.", schema: assignmentSchema },
        403: teachersOnly,
        404: { description: "There is no such studio, or no such song on the asker's shelf (not-found)." },
        409: {
          description:
            "The studio, or a pupil's shelf, holds as much as it may (collection-full), or the id is taken (conflict).",
        },
      },
    },
    async (req, res) => {
      const request = parse(assignmentRequest, req.body);
      res.status(201).json(await assignments.give(currentUserId(res), studioIdIn(req.params), request));
    },
  );

  api.route(
    {
      ...forMembers,
      method: "get",
      path: one,
      summary: "One assignment with the part of each pupil",
      answers: { 200: { description: "The assignment.", schema: assignmentSchema }, 403: teachersOnly, 404: missing },
    },
    async (req, res) => {
      res.json(await assignments.get(currentUserId(res), studioIdIn(req.params), idOf(req.params)));
    },
  );

  api.route(
    {
      ...forMembers,
      method: "put",
      path: one,
      summary: "Change the day it is due and the note to all",
      body: { name: "AssignmentChange", schema: assignmentChange },
      answers: { 200: { description: "Saved.", schema: assignmentSchema }, 403: teachersOnly, 404: missing },
    },
    async (req, res) => {
      const wanted = parse(assignmentChange, req.body);
      res.json(await assignments.change(currentUserId(res), studioIdIn(req.params), idOf(req.params), wanted));
    },
  );

  api.route(
    {
      ...forMembers,
      method: "delete",
      path: one,
      summary: "Take it back with threads and takes; pupils keep their copies of the song",
      answers: { 204: { description: "Taken back." }, 403: teachersOnly, 404: missing },
    },
    async (req, res) => {
      await assignments.remove(currentUserId(res), studioIdIn(req.params), idOf(req.params));
      res.status(204).end();
    },
  );
}
