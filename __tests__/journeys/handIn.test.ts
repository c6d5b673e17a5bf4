import { randomUUID } from "node:crypto";
import type { Page } from "playwright-core";
import { singTune, singWhenCounted, willSing } from "./countedSinger";
import { type Put, shelfOf } from "./shelfOf";
import { typeCredentials } from "./signIn";
import { setStage } from "./stage";

const stage = setStage("kept");

const tempo = 96;
const barS = (4 * 60) / tempo;
const song = {
  ...{
    title: "Back to Me",
    chart:
      "C           F       C\nKettle on and bread to cut,\nC            F         G\nlamps are lit along the quay,",
    demo: null,
    tags: [],
  },
  ...{
    writtenKey: { tonic: "C", mode: "major" },
    beatsPerBar: 4,
    tempo,
    archivedAt: null,
    playedAt: null,
    revision: 0,
  },
  tune: {
    kind: "melody",
    home: "C",
    notes: [60, 62, 64, 65, 67, 69, 67, 67, 65, 64, 65, 64, 62, 64].map((midi, n) => ({
      ...{ start: n + (n > 6 ? 1 : 0), duration: n % 7 === 6 ? 2 : 1, midi },
    })),
  },
};
const password = "kettle rain window";

/** Signs up, has these songs, and signs in at the page; that ends what signed up. */
async function comeIn(page: Page, email: string, next: string, ...songs: Parameters<Put>[1][]): Promise<void> {
  const put = await shelfOf(page, email, password, "sign-up");
  for (const each of songs) await put("songs", each);
  await page.goto(`/account/sign-in?next=${encodeURIComponent(next)}`);
  await typeCredentials(page, email, password);
  await page.waitForURL(`**${next}`);
}

test("a pupil sings what was given and hands it in over a connection that breaks; the teacher hears it, says something at a time, accepts it, and hears nothing once consent is withdrawn", async () => {
  const [pupil, teacher] = [await stage.open("none", "phone"), await stage.open("none", "wide")];
  const [songId, studioId, pupilId, teacherId, assignmentId, partId] = Array.from({ length: 6 }, randomUUID);
  await singWhenCounted(pupil.page);
  await comeIn(teacher.page, "ruth.hand-in@example.org", "/songs");
  const given = { ...song, id: songId!, createdAt: new Date().toISOString() };
  await comeIn(pupil.page, "wil.hand-in@example.org", "/songs", given);
  // The studio as invitation and assignment leave it; journeys of their own go that way.
  const copy = JSON.stringify({ ...song, demo: undefined, tags: undefined }).replaceAll("'", "''");
  await stage.query(`
    UPDATE users SET birth_year = 1980, country = 'DE', confirmed_at = now() WHERE email LIKE '%.hand-in@example.org';
    INSERT INTO studios (id, owner_id, name) SELECT '${studioId}', id, 'Tuesday upstairs' FROM users WHERE email LIKE 'ruth.hand-in%';
    INSERT INTO studio_members (id, studio_id, user_id, role, name, consent_given_at)
      SELECT '${teacherId}'::uuid, '${studioId}'::uuid, id, 'owner', 'Ruth Callow', NULL FROM users WHERE email LIKE 'ruth.hand-in%'
      UNION ALL SELECT '${pupilId}'::uuid, '${studioId}'::uuid, id, 'pupil', 'Wil Sand', now() FROM users WHERE email LIKE 'wil.hand-in%';
    INSERT INTO assignments (id, studio_id, assigned_by, song, note) VALUES ('${assignmentId}', '${studioId}', '${teacherId}', '${copy}', '');
    INSERT INTO assignment_parts (id, studio_id, assignment_id, member_id, song_id, tonic, shift, note)
      VALUES ('${partId}', '${studioId}', '${assignmentId}', '${pupilId}', '${songId}', 'C', 0, '')`);

  const { page } = pupil;
  await page.goto(`/studio/parts/${partId}`);
  await page.getByTestId("sing-it").click();
  await page.getByTestId("sing-start").waitFor();
  await willSing(page, singTune(song.tune.notes, tempo, 80), barS);
  await page.getByTestId("sing-start").click();
  await page.getByTestId("hand-in-now").waitFor({ timeout: 60_000 });
  await page.getByTestId("try-effort").getByRole("radio", { name: "2", exact: true }).click();

  // A slow line, cut while the take is on its way.
  const line = await pupil.context.newCDPSession(page);
  await line.send("Network.enable");
  const slow = { latency: 0, downloadThroughput: -1, uploadThroughput: 60_000 };
  await line.send("Network.emulateNetworkConditions", { ...slow, offline: false });
  const resumedAt: number[] = [];
  page.on("response", (response) => {
    const offset = response.headers()["upload-offset"];
    if (response.request().method() === "HEAD" && offset !== undefined) resumedAt.push(Number(offset));
  });
  await page.getByTestId("hand-in-now").click();
  const sending = page.getByTestId("hand-in-sending");
  await sending.getByRole("progressbar").waitFor();
  await page.waitForFunction(
    () =>
      Number(
        document.querySelector('[data-testid="hand-in-sending"] [role=progressbar]')?.getAttribute("aria-valuenow"),
      ) >= 25,
    undefined,
    { timeout: 40_000 },
  );
  await line.send("Network.emulateNetworkConditions", { ...slow, offline: true });
  await sending.getByText("Waiting for the connection").waitFor({ timeout: 60_000 });
  await line.send("Network.emulateNetworkConditions", { ...slow, uploadThroughput: -1, offline: false });
  // Closed and opened again: the take is still there, and goes on by itself from where it was.
  await page.goto(`/studio/parts/${partId}`);
  await page.getByTestId("pupil-take").waitFor({ timeout: 60_000 });
  expect(await sending.count()).toBe(0);
  expect(Math.max(0, ...resumedAt)).toBeGreaterThan(0);

  // The page where it was sung, opened anew, knows that this take is handed in.
  await page.goto(`/songs/${songId}/try`);
  await page.getByTestId("handed-in").getByText("Open the thread").click();
  await page.getByTestId("pupil-take").waitFor();

  const desk = teacher.page;
  await desk.goto(`/studio/parts/${partId}`);
  await desk.getByTestId("play-take").click();
  await desk
    .getByTestId("take-clock")
    .getByText(/^0:0[2-9] of/)
    .waitFor();
  await desk.getByTestId("say-here").click();
  await desk.getByTestId("comment-text").fill("Here the breath runs out.");
  await desk.getByTestId("send-comment").click();
  await desk.getByTestId("go-to-mark").waitFor();
  await page.reload();
  await page.getByTestId("comment").getByText("Here the breath runs out.").waitFor();

  await desk.getByTestId("answer-message").fill("Lovely, and softer next week.");
  await desk.getByTestId("accept").click();
  await desk.getByTestId("answered").waitFor();

  await stage.query(`UPDATE studio_members SET consent_withdrawn_at = now() WHERE id = '${pupilId}'`);
  await desk.reload();
  await desk.getByTestId("not-shared").waitFor();
  expect(await desk.getByTestId("take-player").count()).toBe(0);
  expect([...pupil.errors, ...teacher.errors]).toEqual([]);
}, 180_000);
