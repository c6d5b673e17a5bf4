import type { DataSource } from "typeorm";
import { mailPreferences, unsubscribed, type Unsubscribed, unsubscribeQuery } from "../../shared/contract/mail";
import type { Api } from "../http/api";
import { currentUserId } from "../http/currentUser";
import { HttpProblem } from "../http/httpProblem";
import { parse } from "../http/parse";
import { MailPreferencesService } from "./mailPreferences.service";

const tag = "mail";
const preferencesSchema = { name: "MailPreferences", schema: mailPreferences };

/** Which mails one gets, and saying no to one kind by a link. */
export function mailRoutes(api: Api, dataSource: DataSource, { tokenSecret }: { tokenSecret: string }): void {
  const preferences = new MailPreferencesService(dataSource, tokenSecret);

  api.route(
    {
      method: "get",
      path: "/mail/preferences",
      tag,
      summary: "Which mails come that one may do without",
      signedIn: true,
      answers: { 200: { description: "The preferences.", schema: preferencesSchema } },
    },
    async (_req, res) => {
      res.json(await preferences.get(currentUserId(res)));
    },
  );

  api.route(
    {
      method: "put",
      path: "/mail/preferences",
      tag,
      summary: "Choose which mails come",
      signedIn: true,
      body: preferencesSchema,
      answers: { 200: { description: "Saved.", schema: preferencesSchema } },
    },
    async (req, res) => {
      const wanted = parse(mailPreferences, req.body);
      await preferences.put(currentUserId(res), wanted);
      res.json(wanted);
    },
  );

  // Mail programs send a form without cookies from anywhere (RFC 8058); the token alone says whose and what.
  api.route(
    {
      method: "post",
      path: "/mail/unsubscribe",
      tag,
      summary: "No more mails of the kind that the token names; may be repeated, with any body or none",
      signedIn: false,
      query: unsubscribeQuery,
      answers: {
        200: { description: "Switched off.", schema: { name: "Unsubscribed", schema: unsubscribed } },
        404: { description: "The link is not one of ours (not-found)." },
      },
    },
    async (req, res) => {
      const { token } = parse(unsubscribeQuery, req.query, "This link is not complete.");
      const kind = await preferences.unsubscribe(token);
      if (!kind) throw new HttpProblem(404, "not-found", "This link is not complete.");
      res.json({ kind } satisfies Unsubscribed);
    },
  );

  api.route(
    {
      method: "get",
      path: "/mail/unsubscribe",
      tag,
      summary: "For mail programs that open the link instead of sending it: leads to the page that asks",
      signedIn: false,
      query: unsubscribeQuery,
      answers: { 303: { description: "To the page; nothing is changed yet." } },
    },
    (req, res) => {
      const { token } = parse(unsubscribeQuery, req.query, "This link is not complete.");
      res.redirect(303, `/account/unsubscribe#${encodeURIComponent(token)}`);
    },
  );
}
