import { randomUUID } from "node:crypto";
import request from "supertest";
import { enqueueMail, type WaitingMail } from "../../server/mail/mail.service";
import { LinkTokensService } from "../../server/mail/linkTokens.service";
import { MailPreferencesService } from "../../server/mail/mailPreferences.service";
import { Postman } from "../../server/mail/postman";
import { Person, startTestServer, type TestServer, tokenSecret } from "./testServer";

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());
beforeEach(() => {
  server.smtp.mails.length = 0;
  server.smtp.refusing = { times: 0, code: 451 };
});

const assigned = (changes: Partial<WaitingMail<"assigned">> = {}): WaitingMail<"assigned"> => ({
  event: `assigned:${randomUUID()}`,
  kind: "assigned",
  to: "jonna@orlow-quay.example",
  userId: null,
  data: { studio: "Evening class", song: "Slack Water", key: "B♭ major", due: "12 December", note: "Softly <b>" },
  path: "/songs",
  ...changes,
});
const put = (mail: WaitingMail<"assigned">) => enqueueMail(server.dataSource, mail);
/** As if the time until the next try had passed. */
const letTimePass = () => server.database.query("UPDATE larkspan_jobs._private_jobs SET run_at = now()");
const jobs = () => server.database.query("SELECT attempts FROM larkspan_jobs.jobs");

it("sends what was committed, in text and HTML, and nothing of what was rolled back", async () => {
  await put(assigned());
  await expect(
    server.dataSource.transaction(async (manager) => {
      await enqueueMail(manager, assigned({ to: "nobody@orlow-quay.example" }));
      throw new Error("changed my mind");
    }),
  ).rejects.toThrow("changed my mind");
  await server.runJobs();
  expect(server.smtp.mails).toHaveLength(1);
  const [mail] = server.smtp.mails;
  expect(mail).toMatchObject({
    to: "jonna@orlow-quay.example",
    from: expect.stringContaining("no-reply@larkspan.test"),
    subject: "A song for you: Slack Water",
  });
  expect(mail?.text).toContain("B♭ major");
  expect(mail?.text).toContain("http://larkspan.test/songs");
  expect(mail?.html).toContain("Softly &lt;b&gt;");
  expect(mail?.headers["auto-submitted"]).toBe("auto-generated");
  expect(await jobs()).toEqual([]);
});

it("sends one mail for one event, however often it is put in and however many processes work", async () => {
  const mail = assigned();
  await put(mail);
  await Promise.all([server.runJobs(), server.runJobs(), server.runJobs()]);
  await put(mail);
  await server.runJobs();
  expect(server.smtp.mails).toHaveLength(1);
});

it("tries again when the mail server is busy, and gives up at once where it says never", async () => {
  server.smtp.refusing = { times: 2, code: 451 };
  await put(assigned());
  await server.runJobs();
  expect(server.smtp.mails).toHaveLength(0);
  expect(await jobs()).toEqual([{ attempts: 1 }]);
  await letTimePass();
  await server.runJobs();
  await letTimePass();
  await server.runJobs();
  expect(server.smtp.mails).toHaveLength(1);

  server.smtp.refusing = { times: 1, code: 550 };
  const never = assigned();
  await put(never);
  await server.runJobs();
  expect(await jobs()).toEqual([]);
  expect(await server.database.query("SELECT state FROM sent_mails WHERE event = $1", [never.event])).toEqual([
    { state: "refused" },
  ]);
});

it("does not send a second time what a process that died may have sent", async () => {
  const mail = assigned();
  await server.database.query("INSERT INTO sent_mails (event, kind, state) VALUES ($1, 'assigned', 'sending')", [
    mail.event,
  ]);
  await put(mail);
  await server.runJobs();
  expect(server.smtp.mails).toHaveLength(0);
});

describe("a mail that may have left", () => {
  const postman = (transport: { sendMail: () => Promise<unknown>; verify?: () => Promise<true> }) =>
    new Postman({
      dataSource: server.dataSource,
      transport: { verify: () => Promise.resolve(true), ...transport } as ConstructorParameters<
        typeof Postman
      >[0]["transport"],
      from: "no-reply@larkspan.test",
      origin: "http://larkspan.test",
      tokens: new LinkTokensService(tokenSecret),
      preferences: new MailPreferencesService(server.dataSource, tokenSecret),
    });
  const stateOf = async (event: string) => {
    const [row] = await server.database.query("SELECT state FROM sent_mails WHERE event = $1", [event]);
    return row?.state;
  };

  it("is not sent again where the connection broke without an answer", async () => {
    const mail = assigned();
    const sendMail = jest.fn(() => Promise.reject(Object.assign(new Error("closed"), { command: "CONN" })));
    await postman({ sendMail }).deliver(mail);
    expect(await stateOf(mail.event)).toBe("uncertain");
    await postman({ sendMail }).deliver(mail);
    expect(sendMail).toHaveBeenCalledTimes(1);
  });

  it("is tried again where nobody was there to take it", async () => {
    const mail = assigned();
    const sendMail = jest.fn(() => Promise.resolve({}));
    const away = Object.assign(new Error("refused"), { syscall: "connect" });
    await expect(postman({ sendMail, verify: () => Promise.reject(away) }).deliver(mail)).rejects.toThrow("refused");
    expect([sendMail.mock.calls.length, await stateOf(mail.event)]).toEqual([0, undefined]);
    await postman({ sendMail }).deliver(mail);
    expect(await stateOf(mail.event)).toBe("sent");
  });
});

it("does not write to somebody whose account is gone meanwhile", async () => {
  await put(assigned({ userId: randomUUID() }));
  await server.runJobs();
  expect(server.smtp.mails).toHaveLength(0);
});

describe("unsubscribing", () => {
  it("takes one click without signing in, for one kind and one person", async () => {
    const person = await Person.signUp(server.app);
    const other = await Person.signUp(server.app);
    await put(assigned({ userId: person.id, to: person.email }));
    await server.runJobs();
    const mail = server.smtp.mails.find(({ subject }) => subject.startsWith("A song"));
    expect(mail?.headers["list-unsubscribe-post"]).toBe("List-Unsubscribe=One-Click");
    const url = /^<http:\/\/larkspan\.test(\/api\/mail\/unsubscribe\?token=[^>]+)>$/.exec(
      mail?.headers["list-unsubscribe"]?.replace(/\s/g, "") ?? "",
    )?.[1];
    expect(url).toBeDefined();
    const opened = await request(server.app).get(url!).expect(303);
    expect(opened.headers.location).toMatch(/^\/account\/unsubscribe#/);
    expect((await person.get("/api/mail/preferences").expect(200)).body.assigned).toBe(true);
    for (let k = 0; k < 2; k++) {
      const done = await request(server.app)
        .post(url!)
        .set("Origin", "https://mail.example")
        .type("form")
        .send({ "List-Unsubscribe": "One-Click" })
        .expect(200);
      expect(done.body).toEqual({ kind: "assigned" });
    }
    const wanted = { assigned: false, handedIn: true, answered: true, weekly: false };
    expect((await person.get("/api/mail/preferences").expect(200)).body).toEqual(wanted);
    expect((await other.get("/api/mail/preferences").expect(200)).body).toEqual({ ...wanted, assigned: true });
    server.smtp.mails.length = 0;
    await put(assigned({ userId: person.id, to: person.email }));
    await server.runJobs();
    expect(server.smtp.mails).toHaveLength(0);
  });

  it("believes no token that this server did not write", async () => {
    const { id } = await Person.signUp(server.app);
    const elsewhere = new MailPreferencesService(server.dataSource, "another secret").unsubscribeToken(id, "assigned");
    const ours = new MailPreferencesService(server.dataSource, tokenSecret).unsubscribeToken(id, "assigned");
    for (const token of [elsewhere, ours.replace("assigned", "weekly"), ours.slice(0, -1), "..", "x"]) {
      await request(server.app).post("/api/mail/unsubscribe").query({ token }).expect(404);
    }
    await request(server.app).post("/api/mail/unsubscribe").expect(422);
  });

  it("is kept as chosen, by its owner", async () => {
    const person = await Person.signUp(server.app);
    const wanted = { assigned: true, handedIn: false, answered: true, weekly: true };
    await person.put("/api/mail/preferences", wanted).expect(200);
    expect((await person.get("/api/mail/preferences").expect(200)).body).toEqual(wanted);
    await person.put("/api/mail/preferences", { ...wanted, security: false }).expect(422);
  });
});

describe("a link's token", () => {
  const tokens = new LinkTokensService(tokenSecret);

  it("is good once, for its purpose, until it is too old or a newer one exists; only a hash is kept", async () => {
    const { id } = await Person.signUp(server.app);
    const wish = { purpose: "try", email: "a@orlow-quay.example", lifeS: 60, userId: id };
    const old = await tokens.issue(server.dataSource, wish);
    const token = tokens.written(await tokens.issue(server.dataSource, wish));
    expect(await tokens.spend(server.dataSource, "try", tokens.written(old))).toBeNull();
    expect(await tokens.spend(server.dataSource, "other", token)).toBeNull();
    expect(await tokens.look(server.dataSource, "try", token)).toMatchObject({ userId: id });
    const both = await Promise.all([1, 2].map(() => tokens.spend(server.dataSource, "try", token)));
    expect(both.filter((spent) => spent?.userId === id)).toHaveLength(1);
    const late = tokens.written(await tokens.issue(server.dataSource, { ...wish, lifeS: 0 }));
    expect(await tokens.spend(server.dataSource, "try", late)).toBeNull();
    const rows = await server.database.query("SELECT * FROM link_tokens WHERE user_id = $1", [id]);
    expect(JSON.stringify(rows)).not.toContain(token);
  });
});

describe("the inbox of development", () => {
  it("shows what was sent, without scripts, and is not there where mail is really sent", async () => {
    await put(assigned());
    await server.runJobs();
    const list = await request(server.app).get("/dev/inbox").expect(200);
    // Mails that other tests of this file caused may lie there too.
    const place = /<a href="(\/dev\/inbox\/\d+)">A song for you: Slack Water<\/a>/.exec(list.text)?.[1] ?? "none";
    const one = await request(server.app).get(place).expect(200);
    expect(one.text).toContain('<a href="http://larkspan.test/songs">');
    expect(one.text).toContain("Softly &lt;b&gt;");
    const html = await request(server.app).get(`${place}/html`).expect(200);
    expect(html.headers["content-security-policy"]).toContain("default-src 'none'");
    for (const { text } of [list, one, html]) expect(text).not.toMatch(/<script|javascript:| on\w+=|<img/i);
    const mails = (await request(server.app).get("/dev/inbox/mails.json").expect(200)).body as unknown[];
    expect(mails).toHaveLength(list.text.split("<li>").length - 1);
    for (const path of ["0", "700", "x"]) await request(server.app).get(`/dev/inbox/${path}`).expect(404);
    const live = await startTestServer({ fakeSmtp: undefined });
    try {
      await request(live.app).get("/dev/inbox").expect(404);
    } finally {
      await live.close();
    }
  });
});
