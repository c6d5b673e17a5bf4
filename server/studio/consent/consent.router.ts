import type { Request } from "express";
import {
  consentRequest,
  guardianLook,
  guardianRequest,
  guardianState,
  linkRequest,
} from "../../../shared/contract/studio/consent";
import { studio } from "../../../shared/contract/studio/studio";
import { addressOf } from "../../http/addressOf";
import type { Api } from "../../http/api";
import { currentUserId } from "../../http/currentUser";
import { HttpProblem } from "../../http/httpProblem";
import { parse } from "../../http/parse";
import { tooMany } from "../../http/tryBucket";
import { linkOver, missingStudio, studioIdIn } from "../studioAnswers";
import type { StudioParts } from "../studioParts";

const link = { name: "Link", schema: linkRequest };

/** What pupils agree to, and the guardians of those who are too young to agree alone. */
export function consentRoutes(api: Api, { access, studios, consent, guardians, limits }: StudioParts): void {
  const tokenIn = async (req: Request<Record<string, string>>) => {
    const { token } = parse(linkRequest, req.body);
    await limits.link.take(addressOf(req));
    return token;
  };

  api.route(
    {
      method: "put",
      path: "/studios/:id/consent",
      tag: "studio",
      summary: "Agree that the teachers of this studio see and hear, or take it back; effective at once",
      signedIn: true,
      body: { name: "Consent", schema: consentRequest },
      answers: {
        200: { description: "The studio after it.", schema: { name: "Studio", schema: studio } },
        404: missingStudio,
        409: { description: "The birth year is not told yet: PUT /account/person first (birth-year-needed)." },
      },
    },
    async (req, res) => {
      const { agree } = parse(consentRequest, req.body);
      const userId = currentUserId(res);
      const { memberId, studioId } = await access.member(userId, studioIdIn(req.params));
      await consent.set(memberId, userId, agree);
      res.json(await studios.get(userId, studioId));
    },
  );

  api.route(
    {
      method: "get",
      path: "/guardian",
      tag: "guardian",
      summary: "Whether a guardian must agree for me, and how far that is",
      signedIn: true,
      answers: { 200: { description: "The state.", schema: { name: "GuardianState", schema: guardianState } } },
    },
    async (_req, res) => {
      res.json(await guardians.state(currentUserId(res)));
    },
  );

  api.route(
    {
      method: "post",
      path: "/guardian",
      tag: "guardian",
      summary: "Name a parent or guardian; they get a mail with a link to decide, good for 14 days",
      signedIn: true,
      body: { name: "GuardianRequest", schema: guardianRequest },
      answers: {
        202: { description: "A mail is on its way.", schema: { name: "GuardianState", schema: guardianState } },
        409: {
          description:
            "Not needed (no-guardian-needed), nothing waits for them (nothing-to-confirm), or another has said no (guardian-decides).",
        },
        429: tooMany,
      },
    },
    async (req, res) => {
      const { email } = parse(guardianRequest, req.body);
      const userId = currentUserId(res);
      await limits.guardian.take(userId);
      await guardians.ask(userId, email);
      res.status(202).json(await guardians.state(userId));
    },
  );

  api.route(
    {
      method: "post",
      path: "/guardian/look",
      tag: "guardian",
      summary: "What a guardian is asked, by the link from the mail",
      signedIn: false,
      body: link,
      answers: {
        200: { description: "The question.", schema: { name: "GuardianLook", schema: guardianLook } },
        410: linkOver,
        429: tooMany,
      },
    },
    async (req, res) => {
      const token = await tokenIn(req);
      const seen = await guardians.look(token);
      if (!seen) throw linkNotValid();
      res.json(seen);
    },
  );

  api.route(
    {
      method: "post",
      path: "/guardian/confirm",
      tag: "guardian",
      summary: "The guardian agrees; a mail brings the link by which they can take it back",
      signedIn: false,
      body: link,
      answers: { 204: { description: "Agreed." }, 410: linkOver, 429: tooMany },
    },
    async (req, res) => {
      const token = await tokenIn(req);
      if (!(await guardians.confirm(token))) throw linkNotValid();
      res.status(204).end();
    },
  );

  api.route(
    {
      method: "post",
      path: "/guardian/withdraw",
      tag: "guardian",
      summary:
        "By the link that asks: no to the studios that wait. By the link kept: takes back the word for all; at once",
      signedIn: false,
      body: link,
      answers: { 204: { description: "Taken back." }, 410: linkOver, 429: tooMany },
    },
    async (req, res) => {
      const token = await tokenIn(req);
      if (!(await guardians.withdraw(token))) throw linkNotValid();
      res.status(204).end();
    },
  );
}

const linkNotValid = () =>
  new HttpProblem(410, "link-not-valid", "This link was used already, or it is too old. Ask for a new one.");
