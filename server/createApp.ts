import compression from "compression";
import cookieParser from "cookie-parser";
import express, { type Express } from "express";
import type { Logger } from "pino";
import type { DataSource } from "typeorm";
import { arrangementsRoutes } from "./arrangements/arrangements.router";
import { adminRoutes } from "./admin/admin.router";
import { accountRoutes } from "./auth/account.router";
import { authRoutes } from "./auth/auth.router";
import { type AuthSettings, authParts } from "./auth/authParts";
import { emailRoutes } from "./auth/email.router";
import { createGuard } from "./auth/guard";
import { recoveryRoutes } from "./auth/recovery.router";
import { secondFactorRoutes } from "./auth/secondFactor/secondFactor.router";
import { chartsRoutes } from "./charts/charts.router";
import { createPersonalData } from "./createPersonalData";
import type { Env } from "./env";
import { Api } from "./http/api";
import { clientFiles } from "./http/clientFiles";
import { descriptionRoutes } from "./http/description.router";
import { errorHandler, unknownRoute } from "./http/errorHandler";
import { healthRoutes } from "./http/health.router";
import { requestLog } from "./http/requestLog";
import { securityHeaders } from "./http/securityHeaders";
import { instrumentsRoutes } from "./instruments/instruments.router";
import { keysRoutes } from "./keys/keys.router";
import { sharedPages, sheetsRoutes } from "./sheets/sheets.router";
import { lineUpsRoutes } from "./lineUps/lineUps.router";
import { songsRoutes } from "./songs/songs.router";
import type { FakeSmtp } from "./mail/inbox/fakeSmtp";
import { inboxPage } from "./mail/inbox/inboxPage";
import { mailRoutes } from "./mail/mail.router";
import { handInsRoutes } from "./studio/handIns/handIns.router";
import { type ObjectStore, storageOrigin } from "./storage/objectStore.service";
import { studioRoutes } from "./studio/studio.router";
import { studioParts } from "./studio/studioParts";
import { voicesRoutes } from "./voices/voices.router";
import { playerWishesRoutes } from "./ways/playerWishes.router";

type AppSettings = Pick<Env, "tokenSecret" | "publicOrigin" | "trustProxy" | "staticDir"> &
  Pick<AuthSettings, "hashCost"> & {
    /** where mails go that are really sent to nobody; shown at /dev/inbox */
    fakeSmtp?: FakeSmtp | undefined;
    /** where recordings are kept */
    objects: ObjectStore;
  };

/** Puts the server together; the only place that knows all its parts. */
export function createApp(dataSource: DataSource, logger: Logger, settings: AppSettings): { app: Express; api: Api } {
  const app = express();
  app.disable("x-powered-by");
  app.set("trust proxy", settings.trustProxy);
  app.use(requestLog(logger));
  app.use(
    securityHeaders(settings.publicOrigin?.startsWith("https:") ?? false, storageOrigin(settings.objects.settings)),
  );

  const api = new Api(createGuard(dataSource, settings.tokenSecret));
  const parts = authParts(dataSource, settings);
  authRoutes(api, parts);
  recoveryRoutes(api, parts);
  const studio = studioParts(dataSource, settings);
  accountRoutes(api, parts, createPersonalData(dataSource, settings), studio.guardians);
  emailRoutes(api, parts);
  secondFactorRoutes(api, parts);
  voicesRoutes(api, dataSource);
  songsRoutes(api, dataSource);
  keysRoutes(api, dataSource);
  instrumentsRoutes(api, dataSource);
  playerWishesRoutes(api, dataSource);
  lineUpsRoutes(api, dataSource);
  arrangementsRoutes(api, dataSource);
  chartsRoutes(api, dataSource);
  mailRoutes(api, dataSource, settings);
  sheetsRoutes(api, dataSource);
  studioRoutes(api, studio);
  adminRoutes(api, dataSource, {
    tokenSecret: settings.tokenSecret,
    stores: [{ name: "recordings", isUp: () => settings.objects.isUp() }],
  });
  handInsRoutes(api, dataSource, settings.objects);
  healthRoutes(api, dataSource);
  descriptionRoutes(api);

  app.use(
    "/api",
    (_req, res, next) => {
      res.set("Cache-Control", "no-store");
      next();
    },
    compression(),
    express.json({ limit: "2mb" }),
    cookieParser(),
    api.router,
    unknownRoute(api),
  );
  if (settings.fakeSmtp) app.use("/dev/inbox", inboxPage(settings.fakeSmtp));
  app.use("/shared", sharedPages(dataSource));
  app.use(clientFiles(settings.staticDir));
  app.use(errorHandler);
  return { app, api };
}
