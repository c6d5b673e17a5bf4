import { randomUUID } from "node:crypto";
import type { Page } from "playwright-core";
import { singTune, singWhenCounted, willSing } from "./countedSinger";
import { shelfOf } from "./shelfOf";
import { typeCredentials } from "./signIn";
import { setStage } from "./stage";

const stage = setStage("kept");

const tempo = 160;
const barS = (4 * 60) / tempo;
const chart = [
  "C           F       C",
  "Kettle on and bread to cut,",
  "C            F         G",
  "lamps are lit along the quay,",
  "C        F           C",
  "shutters open, shutters shut,",
  "G         F        C",
  "bring the morning back to me.",
].join("\n");
const pitches = [
  [60, 62, 64, 65, 67, 69, 67],
  [67, 65, 64, 65, 64, 62, 64],
  [64, 65, 67, 69, 69, 69, 67],
  [67, 65, 64, 62, 60, 62, 60],
];
const notes = pitches.flatMap((line, k) =>
  line.map((midi, n) => ({ start: 8 * k + n, duration: n === 6 ? 2 : 1, midi })),
);
/** The singer's voice ends a little above C5, whatever is set as her range. */
const top = 72.3;
const sungIn = (shift: number) =>
  singTune(
    notes.map((note) => ({ ...note, midi: note.midi + shift })),
    tempo,
    top,
  );

/** An account with a voice set by hand and one song with its tune; its page of keys. */
async function makeSinger(page: Page, email: string): Promise<string> {
  const password = "kettle rain window";
  const put = await shelfOf(page, email, password, "sign-up");
  const createdAt = new Date().toISOString();
  await put("voices", {
    id: randomUUID(),
    name: "Wil",
    byHand: { range: { lowMidi: 55, highMidi: 76 }, comfort: { lowMidi: 58, highMidi: 74 } },
    createdAt,
  });
  const song = randomUUID();
  await put("songs", {
    ...{ id: song, title: "Back to Me", chart, writtenKey: { tonic: "C", mode: "major" } },
    ...{ tune: { kind: "melody", home: "C", notes }, beatsPerBar: 4, tempo, demo: null, tags: [] },
    ...{ archivedAt: null, playedAt: null, createdAt, revision: 0 },
  });
  await page.goto(`/account/sign-in?next=${encodeURIComponent(`/songs/${song}/keys`)}`);
  await typeCredentials(page, email, password);
  await page.waitForURL(`**/songs/${song}/keys`);
  return `/songs/${song}`;
}

/** Sings the whole tune in a key, with the backing or without, and says how it felt. */
async function singIt(page: Page, shift: number, backing: boolean, effort: number): Promise<void> {
  await page.getByTestId("sing-start").waitFor();
  await page
    .getByTestId("try-backing")
    .getByRole("radio", { name: backing ? "On" : "Off" })
    .click();
  await willSing(page, sungIn(shift), barS);
  await page.getByTestId("sing-start").click();
  await page.getByTestId("try-lines").getByText("Kettle").first().waitFor();
  if (!backing) {
    await page.waitForFunction(
      (wanted) =>
        Number.parseInt(document.querySelector('[data-testid="take-seconds"]')?.textContent ?? "0", 10) >= wanted,
      Math.ceil(9 * barS + 2),
      { timeout: 60_000 },
    );
    await page.getByTestId("sing-stop").click();
  }
  // With the backing the take ends by itself.
  await page.getByTestId("try-summary").waitFor({ timeout: 60_000 });
  await page
    .getByTestId("try-effort")
    .getByRole("radio", { name: String(effort), exact: true })
    .click();
}

/** Score of a key in the list of what moved. */
async function scoreOf(page: Page, tonic: string): Promise<number> {
  const row = await page.getByTestId(`rank-${tonic}`).innerText();
  return Number(/(\d+)\s*$/.exec(row)?.[1]);
}

test.each(["phone", "wide"] as const)(
  "on the %s a key that is too high and a good one are sung, measured and told apart, through a reload and without a connection",
  async (viewport) => {
    const { context, page, errors } = await stage.open("none", viewport);
    await singWhenCounted(page);
    const song = await makeSinger(page, `wil.${viewport}@example.org`);

    await page.goto(`${song}/try?key=F&shift=5`);
    await singIt(page, 5, viewport === "phone", 5);
    const summary = await page.getByTestId("try-summary").innerText();
    expect(summary).toMatch(/D5/);
    expect(summary).toMatch(/short/);
    expect(await page.getByTestId(/^try-phrase-/).count()).toBe(4);
    expect(await page.getByTestId("try-phrase-4").innerText()).toMatch(/every note/);

    await page.reload();
    await page.getByTestId("try-summary").waitFor();
    expect(await page.getByTestId("try-summary").innerText()).toBe(summary);
    await page.getByTestId("try-effort").getByRole("radio", { name: "5", checked: true }).waitFor();
    await page.getByTestId("try-keep").click();
    await page.getByTestId("rank-now").waitFor();
    expect(await page.getByTestId("rank-F").getAttribute("aria-label")).toMatch(/^F (went from|stays)/);
    const [, was = "0"] = /(\d+) →/.exec(await page.getByTestId("rank-F").innerText()) ?? [];
    const scoreOfF = await scoreOf(page, "F");
    expect(scoreOfF).toBeLessThan(Number(was));

    await page.goto(`${song}/try?key=C&shift=0`);
    await singIt(page, 0, true, 2);
    expect(await page.getByTestId("try-summary").innerText()).not.toMatch(/short/);
    await context.setOffline(true);
    await page.getByTestId("try-keep").click();
    await page.getByTestId("try-waiting").waitFor();
    expect(await scoreOf(page, "C")).toBeGreaterThan(scoreOfF);
    await context.setOffline(false);
    await page.getByTestId("try-waiting").waitFor({ state: "detached" });

    const table = page.getByTestId("side-by-side");
    expect(await table.getByRole("columnheader").allInnerTexts()).toEqual(["Key", "F", "C"]);
    expect(await table.getByRole("row", { name: /^Felt/ }).innerText()).toMatch(/5 of 5, straining\s+2 of 5, light/);
    await page.getByTestId("take-C").click();
    await table.getByText("C is my key").waitFor();
    expect(errors).toEqual([]);
    await context.close();
  },
  180_000,
);
