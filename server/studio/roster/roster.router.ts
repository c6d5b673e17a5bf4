import { rosterRow } from "../../../shared/contract/studio/roster";
import type { Api } from "../../http/api";
import { currentUserId } from "../../http/currentUser";
import { forMembers, missingStudio, studioIdIn, teachersOnly } from "../studioAnswers";
import type { StudioParts } from "../studioParts";
import { rosterCsv } from "./rosterCsv";

const common = { ...forMembers, method: "get" } as const;

/** The roster, for teachers. */
export function rosterRoutes(api: Api, { roster, groups }: StudioParts): void {
  api.route(
    {
      ...common,
      path: "/studios/:id/roster",
      summary: "Everybody in the studio, by name; of those who do not agree only name and place",
      answers: {
        200: { description: "All of them.", schema: { name: "RosterRow", schema: rosterRow }, list: true },
        403: teachersOnly,
        404: missingStudio,
      },
    },
    async (req, res) => {
      res.json(await roster.rows(currentUserId(res), studioIdIn(req.params)));
    },
  );

  api.route(
    {
      ...common,
      path: "/studios/:id/roster.csv",
      summary: "The same as a table for spreadsheets",
      answers: {
        200: { description: "The table, UTF-8.", mediaType: "text/csv" },
        403: teachersOnly,
        404: missingStudio,
      },
    },
    async (req, res) => {
      const [userId, studioId] = [currentUserId(res), studioIdIn(req.params)];
      const rows = await roster.rows(userId, studioId);
      const names = new Map((await groups.list(userId, studioId)).map(({ id, name }) => [id, name]));
      res.type("text/csv; charset=utf-8").attachment("roster.csv").send(rosterCsv(rows, names));
    },
  );
}
