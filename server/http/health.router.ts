import type { DataSource } from "typeorm";
import { z } from "zod";
import type { Api } from "./api";

const health = z.strictObject({ status: z.enum(["ok", "down"]), database: z.enum(["up", "down"]) });

/** For whoever watches over the server. */
export function healthRoutes(api: Api, dataSource: DataSource): void {
  const schema = { name: "Health", schema: health };
  api.route(
    {
      method: "get",
      path: "/health",
      tag: "service",
      summary: "Whether the server and its database answer",
      signedIn: false,
      answers: {
        200: { description: "All is well.", schema },
        503: { description: "The database does not answer.", schema },
      },
    },
    async (req, res) => {
      try {
        await dataSource.query("SELECT 1");
        res.json({ status: "ok", database: "up" } satisfies z.infer<typeof health>);
      } catch (error) {
        req.log.warn(error);
        res.status(503).json({ status: "down", database: "down" } satisfies z.infer<typeof health>);
      }
    },
  );
}
