import { randomUUID } from "node:crypto";
import type { AddressInfo } from "node:net";
import type { Server } from "node:http";
import type { DataSource } from "typeorm";
import type { SongPage } from "../../shared/contract/songListing";
import { createDataSource } from "../../server/database/dataSource";
import { listingColumns } from "../../server/songs/listingColumns";
import { SongEntity } from "../../server/songs/song.entity";
import { aSong } from "./belongings";
import { Person, startTestServer, type TestServer } from "./testServer";

/** What a page of a large shelf may take, in milliseconds; the median is held to it, as this machine may be busy. */
const mostMs = 50;
const words =
  "harbour lantern slipway rope gull tide water ferry low morning salt oar net loft evening bell fog pier captain sail rudder wave stone bread";

let server: TestServer;
let person: Person;
let listening: Server;
let dataSource: DataSource;

beforeAll(async () => {
  server = await startTestServer();
  person = await Person.signUp(server.app);
  dataSource = await createDataSource(server.database.url, () => undefined).initialize();
  const vocabulary = words.split(" ");
  const word = (k: number) => vocabulary[k % vocabulary.length] ?? "";
  const notes = Array.from({ length: 120 }, (_, k) => ({ start: k / 2, duration: 0.5, midi: 57 + (k % 15) }));
  const songs = Array.from({ length: 2000 }, (_, n) => {
    const line = (k: number) =>
      `G          C          D\n${Array.from({ length: 8 }, (_, w) => word(n * 7 + k * 5 + w * w)).join(" ")}`;
    const song = aSong({
      title: `${word(n)} ${word(n * 3 + 1)} ${n}`,
      chart: Array.from({ length: 32 }, (_, k) => line(k)).join("\n"),
      tune: { kind: "melody", home: "G", notes },
      tags: [word(n % 9), `set ${n % 40}`],
      createdAt: new Date(Date.UTC(2020, 0, 1) + n * 86_400_000).toISOString(),
      playedAt: n % 3 === 0 ? new Date(Date.UTC(2025, 0, 1) + n * 3_600_000).toISOString() : null,
      archivedAt: n % 20 === 0 ? "2026-01-01T00:00:00.000Z" : null,
    });
    return { ...song, ...listingColumns(song), id: randomUUID(), userId: person.id };
  });
  for (let k = 0; k < songs.length; k += 250) await dataSource.manager.insert(SongEntity, songs.slice(k, k + 250));
  await server.database.query("ANALYZE songs");
  listening = server.app.listen(0, "127.0.0.1");
  await new Promise((resolve) => listening.once("listening", resolve));
});
afterAll(async () => {
  await new Promise((resolve) => listening.close(resolve));
  await dataSource.destroy();
  await server.close();
});

async function ask(query: string): Promise<SongPage> {
  const { port } = listening.address() as AddressInfo;
  const answer = await fetch(`http://127.0.0.1:${port}/api/songs/page?${query}`, {
    headers: { Authorization: `Bearer ${person.token}` },
  });
  expect(answer.status).toBe(200);
  return (await answer.json()) as SongPage;
}

/** The last page that a cursor leads to. */
async function deepest(query: string): Promise<string> {
  let cursor = "";
  for (;;) {
    const { next } = await ask(`${query}&limit=200${cursor && `&cursor=${cursor}`}`);
    if (next === null) return cursor;
    cursor = next;
  }
}

it("gives a page of 2,000 songs in a twinkling, however deep, sorted and searched", async () => {
  const questions = [
    "limit=50",
    "limit=200",
    "sort=played&limit=50",
    "sort=saved&limit=50",
    "tag=rope",
    "q=lantern+slip",
    "q=zzz",
    "q=e",
  ];
  for (const sort of ["title", "played", "saved"])
    questions.push(`sort=${sort}&limit=50&cursor=${await deepest(`sort=${sort}`)}`);
  const lines: string[] = [];
  const medians: number[] = [];
  for (const question of questions) {
    const taken: number[] = [];
    for (let k = 0; k < 20; k++) {
      const start = performance.now();
      await ask(question);
      taken.push(performance.now() - start);
    }
    taken.sort((a, b) => a - b);
    const [p50 = 0, p95 = 0] = [taken[9], taken[18]];
    medians.push(p50);
    lines.push(
      `${question.replace(/cursor=.*/, "cursor=deep").padEnd(36)} p50 ${p50.toFixed(1)} ms  p95 ${p95.toFixed(1)} ms`,
    );
  }
  process.stdout.write(`${lines.join("\n")}\n`);
  expect(Math.max(...medians)).toBeLessThan(mostMs);
});
