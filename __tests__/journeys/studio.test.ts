import { randomUUID } from "node:crypto";
import type { Page } from "playwright-core";
import { axeFaults } from "./axeFaults";
import { tokenFor } from "./mailbox";
import { shelfOf } from "./shelfOf";
import { signInAsRuth, typeCredentials } from "./signIn";
import { setStage } from "./stage";

const stage = setStage("kept");
const password = "kettle rain window";

/** Signs the demonstration's teacher in and opens her studio; the address of it. */
async function openStudio(page: Page): Promise<string> {
  await signInAsRuth(page, "/studio");
  await page
    .getByTestId(/^studio-/)
    .first()
    .click();
  await page.getByTestId("roster").waitFor();
  return new URL(page.url()).pathname;
}

/** The teacher invites an address; the link out of the mail, as a path. */
async function invite(page: Page, studio: string, email: string): Promise<string> {
  await page.goto(`${studio}/invite`);
  await page.getByTestId("invite-emails").fill(email);
  await page.getByTestId("send-invites").click();
  await page.getByTestId("invited").waitFor();
  return `/invite#${await tokenFor(page, email, "/invite")}`;
}

/** From the mail: reads what a teacher sees, makes an account, and joins under a name. */
async function join(page: Page, link: string, who: { email: string; name: string; year: string }): Promise<void> {
  await page.goto(link);
  await page.getByTestId("what-is-seen").waitFor();
  await page.waitForURL(/\/invite$/);
  await page.getByTestId("invite-sign-up").click();
  await page.waitForURL("**/account/sign-up**");
  await typeCredentials(page, who.email, password);
  await page.getByTestId("join-name").fill(who.name);
  await page.getByTestId("join-year").fill(who.year);
  await page
    .getByTestId("join-wish")
    .getByRole("radio", { name: /^I agree/ })
    .click();
  await page.getByTestId("join").click();
  await page.getByTestId("joined").waitFor();
}

const aVoice = (lowMidi: number) => ({
  ...{ id: randomUUID(), name: "Mine", createdAt: new Date().toISOString() },
  byHand: {
    range: { lowMidi, highMidi: lowMidi + 21 },
    comfort: { lowMidi: lowMidi + 3, highMidi: lowMidi + 17 },
  },
});

test("a pupil joins from the mail and gets a song in their own key; without consent the teacher sees nothing", async () => {
  const at = await stage.open("none", "wide");
  const home = await stage.open("none", "phone", "dark");
  const [email, name] = ["wil@orlow.example", "Wil Harrow"] as const;
  const studio = await openStudio(at.page);
  expect(await axeFaults(at.page)).toEqual([]);
  await join(home.page, await invite(at.page, studio, email), { email, name, year: "1988" });
  const put = await shelfOf(home.page, email, password, "sign-in");
  await put("voices", aVoice(50));

  await at.page.goto(`${studio}/assign`);
  await at.page.getByTestId("assign-song").selectOption({ label: "Fog Bell" });
  await at.page.getByTestId("who-none").click();
  const row = at.page.getByTestId("assign-row").filter({ hasText: name });
  await row.getByRole("checkbox", { name: `Give it to ${name}` }).check();
  const proposed = row.getByTestId(/^key-/).locator("option:checked");
  await row.getByText(/left above|in reach/).waitFor();
  const key = (await proposed.innerText()).split(",")[0]!;
  expect(await axeFaults(at.page)).toEqual([]);
  await at.page.getByTestId("assign-note").fill("Softly, as over water.");
  await at.page.getByTestId("give").click();
  await at.page.getByTestId("assignment-parts").waitFor();

  await home.page.goto("/studio");
  await home.page.getByTestId(/^part-/).click();
  await home.page.getByTestId("assignment-note").getByText("Softly, as over water.").waitFor();
  expect(await home.page.getByTestId("part-key").innerText()).toContain(key.replace(/m$/, ""));
  expect(await axeFaults(home.page)).toEqual([]);
  await home.page.getByTestId("comment-text").fill("The low notes are far down.");
  await home.page.getByTestId("send-comment").click();
  await home.page.getByTestId("comment").waitFor();
  await home.page.getByTestId("part-sheet").click();
  await home.page.waitForURL(/\/songs\/[\w-]+\/sheet/);

  await at.page
    .getByTestId(/^part-/)
    .first()
    .click();
  await at.page.getByTestId("comment").getByText("The low notes are far down.").waitFor();
  const part = at.page.url();

  await home.page.goto("/account/sharing");
  await home.page.getByTestId("consent-switch").click();
  await home.page.getByTestId("remove-confirmed").click();
  await home.page
    .getByTestId("consent-state")
    .getByText(/see only your name/)
    .waitFor();
  expect(await axeFaults(home.page)).toEqual([]);
  await at.page.goto(part);
  await at.page.getByTestId("not-shared").waitFor();
  expect(await at.page.getByText("The low notes are far down.").count()).toBe(0);
  await at.page.goto(`${studio}?q=${encodeURIComponent(name)}`);
  const silent = at.page.getByTestId("pupil").filter({ hasText: name });
  expect(await silent.innerText()).toMatch(/has taken the agreement back/);
  expect([at.errors, home.errors]).toEqual([[], []]);
  await at.context.close();
  await home.context.close();
}, 180_000);

test("a guardian decides by the link from the mail, and until then and after taking it back nothing is shared", async () => {
  const at = await stage.open("none", "wide");
  const home = await stage.open("none", "phone");
  const [email, parent, name] = ["cass.young@orlow.example", "parent@orlow.example", "Kit Young"];
  const studio = await openStudio(at.page);
  await join(home.page, await invite(at.page, studio, email), { email, name, year: "2013" });
  await home.page.getByTestId("guardian-email").fill(parent);
  await home.page.getByTestId("ask-guardian").click();
  await home.page.getByTestId("guardian-asked").waitFor();
  const put = await shelfOf(home.page, email, password, "sign-in");
  await put("voices", aVoice(57));
  const seen = async () => {
    await at.page.goto(`${studio}?q=${encodeURIComponent(name)}`);
    return at.page.getByTestId("pupil").filter({ hasText: name }).innerText();
  };
  expect(await seen()).toMatch(/waits for the guardian/);

  const guardian = await stage.open("none", "phone", "dark");
  const asked = await tokenFor(guardian.page, parent, "/guardian");
  await guardian.page.goto(`/guardian#${asked}`);
  await guardian.page.getByTestId("what-is-seen").waitFor();
  expect(await axeFaults(guardian.page)).toEqual([]);
  await guardian.page.getByTestId("guardian-confirm").click();
  await guardian.page.getByTestId("guardian-done").waitFor();
  expect(await seen()).not.toMatch(/waits for the guardian/);

  await home.page.goto("/account/sharing");
  await home.page
    .getByTestId("guardian-state")
    .getByText(/confirmed/)
    .waitFor();
  // The mail that came after agreeing carries the link to take it back.
  const kept = await tokenFor(guardian.page, parent, "/guardian", asked);
  await guardian.page.goto(`/guardian#${kept}`);
  await guardian.page.getByTestId("guardian-withdraw").click();
  await guardian.page.getByTestId("guardian-done").waitFor();
  expect(await seen()).toMatch(/waits for the guardian|has taken the agreement back/);
  expect([at.errors, home.errors, guardian.errors]).toEqual([[], [], []]);
  for (const { context } of [at, home, guardian]) await context.close();
}, 180_000);
