import { randomUUID } from "node:crypto";
import { mkdtempSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import type { Express } from "express";
import { Pool } from "pg";
import request, { type Test } from "supertest";
import type { DataSource } from "typeorm";
import type { Role, SessionResponse } from "../../shared/contract/account";
import { signAccessToken } from "../../server/auth/accessToken";
import { createApp } from "../../server/createApp";
import { createJobs } from "../../server/createJobs";
import { createDataSource } from "../../server/database/dataSource";
import type { Api } from "../../server/http/api";
import { createLogger } from "../../server/http/requestLog";
import { workOffQueue } from "../../server/jobs/jobWorker";
import { FakeSmtp } from "../../server/mail/inbox/fakeSmtp";
import { FakeS3 } from "../../server/storage/fake/fakeS3";
import { ObjectStore } from "../../server/storage/objectStore.service";
import { createTestDatabase, type TestDatabase } from "./testDatabase";

export const tokenSecret = "a secret of the tests, long enough for HS256";

/** A password that the contract allows. */
export const password = "lanterns on the slipway";

/** The least that argon2 takes; `hashCost: undefined` makes a server hash as it does in earnest. */
const quick = { memoryCost: 1024, timeCost: 2 };

type Settings = Parameters<typeof createApp>[2];

export interface TestServer {
  app: Express;
  api: Api;
  database: TestDatabase;
  dataSource: DataSource;
  /** where its mails go */
  smtp: FakeSmtp;
  /** where its recordings lie */
  s3: FakeS3;
  /** does what waits in the queue and is due */
  runJobs: () => Promise<void>;
  close: () => Promise<void>;
}

/** The real application on a database of its own. */
export async function startTestServer(
  settings: Partial<Settings> = {},
  logger = createLogger("silent"),
): Promise<TestServer> {
  const database = await createTestDatabase();
  const dataSource = await createDataSource(database.url, () => undefined).initialize();
  const nothing = mkdtempSync(path.join(tmpdir(), "larkspan-nothing-"));
  const smtp = await FakeSmtp.start();
  const s3 = await FakeS3.start(path.join(nothing, "storage"));
  const objects = new ObjectStore(s3.settings);
  const { app, api } = createApp(dataSource, logger, {
    tokenSecret,
    publicOrigin: null,
    trustProxy: false,
    staticDir: nothing,
    fakeSmtp: smtp,
    objects,
    hashCost: quick,
    ...settings,
  });
  const jobs = createJobs(dataSource, {
    tokenSecret,
    smtpUrl: smtp.url,
    mailFrom: "Larkspan <no-reply@larkspan.test>",
    objects,
    origin: settings.publicOrigin ?? "http://larkspan.test",
  });
  const pool = new Pool({ connectionString: database.url, max: 3 });
  pool.on("error", () => undefined);
  pool.on("connect", (client) => client.on("error", () => undefined));
  const close = async () => {
    jobs.close();
    await pool.end();
    await Promise.all([smtp.stop(), s3.stop()]);
    if (dataSource.isInitialized) await dataSource.destroy();
    await database.drop();
  };
  return { app, api, database, dataSource, smtp, s3, runJobs: () => workOffQueue(pool, jobs), close };
}

/** Somebody with an account of their own. */
export class Person {
  private constructor(
    private readonly app: Express,
    readonly id: string,
    readonly email: string,
    readonly token: string,
    /** name=value of the refresh cookie */
    readonly cookie: string,
  ) {}

  static async signUp(app: Express, email = `${randomUUID()}@orlow-quay.example`): Promise<Person> {
    const response = await request(app).post("/api/auth/sign-up").send({ email, password }).expect(201);
    const { account, accessToken } = response.body as SessionResponse;
    return new Person(app, account.id, email, accessToken, cookieOf(response));
  }

  /** Somebody who never typed a password: as the database would hold them, with a session. Quick, for tests with many people. */
  static async put({ app, database }: TestServer, role: Role, confirmed: boolean): Promise<Person> {
    const email = `${randomUUID()}@orlow-quay.example`;
    const [row] = await database.query(
      `WITH person AS (
         INSERT INTO users (email, password_hash, role, confirmed_at) VALUES ($1, 'none', $2, $3) RETURNING id
       )
       INSERT INTO sessions (user_id, expires_at) SELECT id, now() + interval '1 hour' FROM person
       RETURNING id, user_id`,
      [email, role, confirmed ? new Date() : null],
    );
    const [id, sessionId] = [String(row?.user_id), String(row?.id)];
    return new Person(app, id, email, signAccessToken(tokenSecret, id, sessionId), "");
  }

  get(path: string): Test {
    return this.asking(request(this.app).get(path));
  }

  put(path: string, body: object): Test {
    return this.asking(request(this.app).put(path).send(body));
  }

  post(path: string, body: object = {}): Test {
    return this.asking(request(this.app).post(path).send(body));
  }

  head(path: string): Test {
    return this.asking(request(this.app).head(path));
  }

  patch(path: string, body: Buffer): Test {
    return this.asking(request(this.app).patch(path).send(body));
  }

  delete(path: string): Test {
    return this.asking(request(this.app).delete(path));
  }

  private asking(test: Test): Test {
    return test.set("Authorization", `Bearer ${this.token}`);
  }
}

/** All of Set-Cookie, one string for each cookie. */
export function setCookies(response: { headers: Record<string, unknown> }): string[] {
  return (response.headers["set-cookie"] as string[] | undefined) ?? [];
}

/** name=value of the one cookie that an answer sets. */
export function cookieOf(response: { headers: Record<string, unknown> }): string {
  return setCookies(response)[0]?.split(";")[0] ?? "";
}
