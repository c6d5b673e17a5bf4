import { inflateSync } from "node:zlib";
import request, { type Response } from "supertest";
import { startTestServer, type TestServer } from "./testServer";

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());
beforeEach(() => server.database.query("DELETE FROM tries"));

const print = (body: object) => request(server.app).post("/api/charts/pdf").send(body).buffer(true).parse(bytesOf);

function bytesOf(response: Response, done: (error: Error | null, body: unknown) => void): void {
  const stream = response as unknown as NodeJS.ReadableStream;
  const chunks: Buffer[] = [];
  stream.on("data", (chunk: Buffer) => chunks.push(chunk));
  stream.on("end", () => done(null, Buffer.concat(chunks)));
}

const chart = "Chorus\nF#m7b5    Bb\nlow água and a rope\n";

/** All that a PDF says, by its fonts' tables from glyphs to characters; each page by itself. */
function pagesOf(pdf: Buffer): string[] {
  const source = pdf.toString("latin1");
  const objects = new Map<string, string>();
  for (const [, id = "", body = ""] of source.matchAll(/(\d+) 0 obj\n([\s\S]*?)\nendobj/g)) objects.set(id, body);
  const streamOf = (id: string) => {
    const raw = /stream\n([\s\S]*?)\nendstream/.exec(objects.get(id) ?? "")?.[1] ?? "";
    return inflateSync(Buffer.from(raw, "latin1")).toString("latin1");
  };
  const table = (fontId: string) => {
    const [, map = ""] = /\/ToUnicode (\d+) 0 R/.exec(objects.get(fontId) ?? "") ?? [];
    const codes = [...streamOf(map).matchAll(/\[([^\]]*)\]/g)].flatMap(
      ([, list = ""]) => list.match(/<[\da-f ]*>/gi) ?? [],
    );
    return codes.map((code) => String.fromCodePoint(Number.parseInt(code.replace(/\W/g, "") || "20", 16)));
  };
  const fonts = new Map<string, string[]>();
  for (const [, name = "", id = ""] of source.matchAll(/\/(F\d+) (\d+) 0 R/g)) fonts.set(name, table(id));
  const pages = [...objects.values()].filter((body) => /\/Type \/Page\b(?!s)/.test(body));
  return pages.map((page) => {
    const content = streamOf(/\/Contents (\d+) 0 R/.exec(page)?.[1] ?? "");
    let font: string[] = [];
    let text = "";
    for (const [, name, shown] of content.matchAll(/\/(F\d+) [\d.]+ Tf|\[([^\]]*)\] TJ/g)) {
      if (name) font = fonts.get(name) ?? [];
      for (const [, hex = ""] of (shown ?? "").matchAll(/<([\da-f]+)>/gi))
        for (const code of hex.match(/.{4}/g) ?? []) text += font[Number.parseInt(code, 16)] ?? "";
      if (shown !== undefined) text += "|";
    }
    return text;
  });
}

it("sets a chart with its title, key, chords and words, open to everybody", async () => {
  const body = { title: "Gulls in B♭", chart, key: { tonic: "Bb", mode: "minor" }, paper: "A4" };
  const answer = await print(body).expect(200).expect("Content-Type", "application/pdf");
  expect(answer.headers["content-disposition"]).toMatch(/^attachment; filename=.*Gulls/);
  const pdf = answer.body as Buffer;
  expect(pdf.subarray(0, 5).toString()).toBe("%PDF-");
  expect(pdf.toString("latin1")).toMatch(/\/MediaBox \[0 0 595\.28 841\.89\]/);
  const [page = "", ...others] = pagesOf(pdf);
  expect(others).toEqual([]);
  const said = page.replaceAll("|", "");
  for (const part of ["Gulls in B♭", "B♭ minor", "Chorus", "F♯m7♭5", "low água and a rope", "1 / 1"])
    expect(said).toContain(part);
});

it("fills as many pages as it needs, numbers them, and parts no chord line from its words", async () => {
  const long = Array.from({ length: 60 }, (_, k) => `G     D\nline ${k} end`).join("\n");
  const answer = await print({ title: "Long", chart: long, paper: "Letter" }).expect(200);
  expect((answer.body as Buffer).toString("latin1")).toMatch(/\/MediaBox \[0 0 612 792\]/);
  const pages = pagesOf(answer.body as Buffer);
  expect(pages).toHaveLength(3);
  for (const [k, page] of pages.entries()) {
    expect(page).toContain(`${k + 1} / 3`);
    const chords = page.match(/G {5}D/g) ?? [];
    expect(chords.length).toBeGreaterThan(5);
    expect(page.match(/line \d+ end/g)).toHaveLength(chords.length);
  }
});

it("wraps a long line with its chords over their words", async () => {
  const words = Array.from({ length: 30 }, (_, k) => `word${k}`).join(" ");
  const chords = words.replace(/word\d+/g, (word) => "Am".padEnd(word.length));
  const [page = ""] = pagesOf(
    (await print({ title: "Wide", chart: `${chords}\n${words}`, paper: "A4" }).expect(200)).body as Buffer,
  );
  const lines = page.split("|").filter((line) => /Am|word/.test(line));
  for (let k = 0; k < lines.length; k += 2)
    expect((lines[k] ?? "").match(/Am/g)?.length).toBe((lines[k + 1] ?? "").match(/word\d+/g)?.length);
  expect(lines.length).toBeGreaterThan(3);
});

it.each([
  ["control characters and signs no font has", "\u0000\u0007😀 שלום עולם Żółć Жук\t\tx\n\u202eabc\ud83c", 200],
  ["a hundred thousand line breaks", "\n".repeat(100_000), 200],
  ["one word of a hundred thousand letters", "x".repeat(100_000), 200],
  ["a line of fifty thousand chords", "G ".repeat(50_000), 200],
  ["fifty thousand signs that no font has", "😀".repeat(45_000), 200],
  ["a hundred thousand tabulators", "\t".repeat(100_000), 200],
  ["more pages than anybody prints", "G\n".repeat(50_000), 422],
  ["more bytes than are taken", "♯".repeat(100_000), 413],
])("answers %s without a fault, and soon", async (_what, hostile, status) => {
  const answer = await print({ title: "\u0007😀", chart: hostile, paper: "A4" });
  expect(answer.status).toBe(status);
});

it.each([
  [{ title: " ", chart: "", paper: "A4" }, "title"],
  [{ title: "a", chart: "x".repeat(100_001), paper: "A4" }, "chart"],
  [{ title: "a", chart: "", paper: "A5" }, "paper"],
  [{ title: "a", chart: "", paper: "A4", key: { tonic: "H", mode: "major" } }, "key.tonic"],
  [{ title: "a", chart: "", paper: "A4", more: 1 }, "more"],
])("names what does not fit", async (body, path) => {
  const answer = await request(server.app).post("/api/charts/pdf").send(body).expect(422);
  expect(answer.body).toMatchObject({ code: "invalid", fields: [{ path }] });
});

it("lets one address print sixty in a minute, and then says how long to wait", async () => {
  await print({ title: "First", chart, paper: "A4" }).expect(200);
  await server.database.query("UPDATE tries SET points = 60 WHERE key LIKE 'chart-pdf%'");
  const answer = await request(server.app)
    .post("/api/charts/pdf")
    .send({ title: "Late", chart, paper: "A4" })
    .expect(429);
  expect(answer.body.code).toBe("too-many-tries");
  expect(Number(answer.headers["retry-after"])).toBeGreaterThan(0);
});

const sheet = {
  ...{ title: "Gulls in B♭", facts: "", chart, singer: "Maren", firstNote: "F4", strokes: null, tune: null, order: "" },
  from: { tonic: "Bb", mode: "minor" },
  key: { tonic: "C", mode: "minor" },
  instrument: {
    ...{ name: "Box guitar", strings: ["A3", "D4", "F#4"], tuned: ["A3", "D4", "F#4"] },
    ...{ fretNames: null, leftHanded: false, retune: 0, capo: 3, shapeKey: { tonic: "A", mode: "minor" } },
  },
  chords: [
    {
      ...{ written: "Bb", sounding: "C", played: "A" },
      shape: { frets: [0, null, 3], fingers: [0, 0, 3], barre: null, reachMm: 20, ease: 0.5, roots: [0] },
    },
  ],
};
const options = { paper: "A4", grids: "side", numbers: true, letters: "usual", shows: "played", leftHanded: true };

it("sets a sheet as the layout has it: capo, shapes, what is heard and the grid, open to everybody", async () => {
  const answer = await request(server.app)
    .post("/api/sheets/pdf")
    .send({ sheet, options })
    .buffer(true)
    .parse(bytesOf)
    .expect(200)
    .expect("Content-Type", "application/pdf");
  const pages = pagesOf(answer.body as Buffer);
  expect(pages).toHaveLength(1);
  const said = pages[0]!.replaceAll("|", "");
  for (const part of ["Capo 3", "for Maren", "A-D-F♯", "Chorus", "low água and a rope", "sounds C", "F4 is sung first"])
    expect(said).toContain(part);
});

it.each([
  [{ sheet: { ...sheet, key: { tonic: "H", mode: "minor" } }, options }, "sheet.key.tonic"],
  [{ sheet, options: { ...options, paper: "A5" } }, "options.paper"],
  [{ sheet: { ...sheet, chords: [{ ...sheet.chords[0], shape: { frets: [99] } }] }, options }, "sheet.chords.0"],
])("names what of a sheet does not fit", async (body, path) => {
  const answer = await request(server.app).post("/api/sheets/pdf").send(body).expect(422);
  expect(answer.body.fields[0].path.startsWith(path)).toBe(true);
});

it("refuses a sheet that would fill a book", async () => {
  const long = { ...sheet, chart: "G\n".repeat(40_000) };
  await request(server.app).post("/api/sheets/pdf").send({ sheet: long, options }).expect(422);
});
