import { linkRequest } from "../../../shared/contract/studio/consent";
import { invite, inviteAcceptance, inviteLook, inviteRequest } from "../../../shared/contract/studio/invite";
import { studio } from "../../../shared/contract/studio/studio";
import { addressOf } from "../../http/addressOf";
import type { Api } from "../../http/api";
import { currentUserId } from "../../http/currentUser";
import { HttpProblem } from "../../http/httpProblem";
import { idIn } from "../../http/ownedCollection.router";
import { parse } from "../../http/parse";
import { tooMany } from "../../http/tryBucket";
import { forMembers, linkOver, missingStudio, studioIdIn, teachersOnly } from "../studioAnswers";
import type { StudioParts } from "../studioParts";

const inviteSchema = { name: "Invite", schema: invite };
const missing = { description: "There is no such invitation (not-found)." };

const teachersOrOwner = {
  description: "Not a teacher (teachers-only), or to invite a teacher and not the owner (owner-only).",
};

/** Invitations: made, sent again and taken back by teachers; looked at and accepted by whoever has the link. */
export function invitesRoutes(api: Api, { invites, studios, limits }: StudioParts): void {
  api.route(
    {
      ...forMembers,
      method: "get",
      path: "/studios/:id/invites",
      summary: "The invitations of a studio, newest first, with those that are over",
      answers: {
        200: { description: "The invitations.", schema: inviteSchema, list: true },
        403: teachersOnly,
        404: missingStudio,
      },
    },
    async (req, res) => {
      res.json(await invites.list(currentUserId(res), studioIdIn(req.params)));
    },
  );

  api.route(
    {
      ...forMembers,
      method: "post",
      path: "/studios/:id/invites",
      summary: "Invite by mail, each by a link that is good once, for seven days; only the owner invites co-teachers",
      body: { name: "InviteRequest", schema: inviteRequest },
      answers: {
        201: { description: "Written to.", schema: inviteSchema, list: true },
        403: { description: "Not a teacher (teachers-only, owner-only), or an unconfirmed address (unconfirmed)." },
        404: missingStudio,
        409: { description: "The studio has as many open invitations as it may (collection-full)." },
        429: tooMany,
      },
    },
    async (req, res) => {
      const request = parse(inviteRequest, req.body);
      const userId = currentUserId(res);
      await limits.invited.take(userId, request.emails.length);
      res.status(201).json(await invites.make(userId, studioIdIn(req.params), request));
    },
  );

  api.route(
    {
      ...forMembers,
      method: "post",
      path: "/studios/:id/invites/:inviteId/resend",
      summary: "Send a new link, good for seven days from now; the old one is worth nothing then",
      answers: {
        200: { description: "Written to again.", schema: inviteSchema },
        403: teachersOrOwner,
        404: missing,
        409: { description: "It was accepted or taken back (invite-over)." },
        429: tooMany,
      },
    },
    async (req, res) => {
      const inviteId = idIn(req.params, "inviteId", "invitation");
      const userId = currentUserId(res);
      await limits.invited.take(userId);
      res.json(await invites.resend(userId, studioIdIn(req.params), inviteId));
    },
  );

  api.route(
    {
      ...forMembers,
      method: "delete",
      path: "/studios/:id/invites/:inviteId",
      summary: "Take an invitation back; its link is worth nothing from now on",
      answers: { 204: { description: "Taken back." }, 403: teachersOrOwner, 404: missing },
    },
    async (req, res) => {
      const inviteId = idIn(req.params, "inviteId", "invitation");
      await invites.revoke(currentUserId(res), studioIdIn(req.params), inviteId);
      res.status(204).end();
    },
  );

  api.route(
    {
      method: "post",
      path: "/invites/look",
      tag: "studio",
      summary: "What an invitation is, before accepting it: the studio, its teachers, and what they would see",
      signedIn: false,
      body: { name: "Link", schema: linkRequest },
      answers: {
        200: { description: "The invitation.", schema: { name: "InviteLook", schema: inviteLook } },
        410: linkOver,
        429: tooMany,
      },
    },
    async (req, res) => {
      const { token } = parse(linkRequest, req.body);
      await limits.link.take(addressOf(req));
      const seen = await invites.look(token);
      if (!seen) throw linkNotValid();
      res.json(seen);
    },
  );

  api.route(
    {
      ...forMembers,
      method: "post",
      path: "/invites/accept",
      summary: "Join the studio, with any account; agreeing to be seen may also come later",
      body: { name: "InviteAcceptance", schema: inviteAcceptance },
      answers: {
        201: { description: "Joined.", schema: { name: "Studio", schema: studio } },
        409: { description: "One is in it already (already-member); the birth year is not told (birth-year-needed)." },
        410: linkOver,
        429: tooMany,
      },
    },
    async (req, res) => {
      const acceptance = parse(inviteAcceptance, req.body);
      await limits.link.take(addressOf(req));
      const userId = currentUserId(res);
      const studioId = await invites.accept(userId, acceptance);
      if (studioId === null) throw linkNotValid();
      res.status(201).json(await studios.get(userId, studioId));
    },
  );
}

const linkNotValid = () =>
  new HttpProblem(
    410,
    "link-not-valid",
    "This invitation was used, taken back, or is older than seven days. Ask your teacher for a new one.",
  );
