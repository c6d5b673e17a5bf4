import { randomUUID } from "node:crypto";
import { axeFaults } from "./axeFaults";
import { typeCredentials } from "./signIn";
import { setStage } from "./stage";

const stage = setStage("kept");

test("an odd instrument is built on the phone, heard, offered for a song's ways, taken into an account, and on the wide page changed and deleted", async () => {
  const { context, page, errors } = await stage.open("none", "phone", "light");
  await page.addInitScript(() => {
    const plucked: number[] = [];
    (globalThis as unknown as { plucked: number[] }).plucked = plucked;
    const start = AudioBufferSourceNode.prototype.start;
    AudioBufferSourceNode.prototype.start = function (...args) {
      plucked.push(this.buffer?.length ?? 0);
      return start.apply(this, args as [number]);
    };
  });

  // Built: a short drone beside two strings over diatonic frets.
  await page.goto("/instruments");
  await page.getByTestId("new-instrument").click();
  await page.getByTestId("instrument-name").fill("Net-loft drone");
  for (const [k, note] of ["D4", "D3", "A3"].entries()) await page.getByTestId(`note-${k}`).fill(note);
  await page.getByTestId("more-0").click();
  await page.getByTestId("short-0").click();
  await page.getByTestId("length-0").fill("480");
  await page.getByTestId("starts-0").fill("4");
  await page.getByTestId("fret-kind").selectOption("diatonic-half");
  await page.getByTestId("frets").fill("16");
  await page.getByTestId("capo-to").fill("0");
  expect(await page.getByTestId("neck").getAttribute("aria-label")).toMatch(
    /D4, short from fret 4; D3; A3\. 16 frets of a fret map/,
  );

  // Heard: one string, then all.
  await page.getByTestId("hear-0").click();
  await page.getByText("Sounding: D4, 293.7 Hz").waitFor();
  await page.getByTestId("hear-all").click();
  await page.getByText("Sounding: A3, 220.0 Hz").waitFor();
  expect(await page.evaluate(() => (globalThis as unknown as { plucked: number[] }).plucked.length)).toBe(4);
  expect(await axeFaults(page)).toEqual([]);

  // A reload loses nothing; then it is kept and marked.
  await page.reload();
  await page.getByTestId("draft-restored").waitFor();
  expect(await page.getByTestId("starts-0").inputValue()).toBe("4");
  await page.getByTestId("keep-instrument").click();
  const list = page.getByRole("list", { name: "Yours" });
  await list.getByRole("button", { name: "I play this: Net-loft drone" }).click();
  await page.getByText("Ways are found for Net-loft drone first", { exact: false }).waitFor();

  // Offered where a song's ways are found.
  await page.goto("/songs");
  await page.getByText("Pull the Shutters").first().click();
  await page.getByTestId("chart").waitFor();
  await page.goto(`${page.url().replace(/[?#].*$/, "")}/ways?key=D&shift=0`);
  await page.getByRole("button", { name: "Instrument: Net-loft drone" }).click();
  await page.getByTestId("find-choice").fill("net-loft");
  await page
    .getByTestId("instrument-dialog")
    .getByRole("button", { name: /Net-loft drone/ })
    .waitFor();
  expect(await axeFaults(page)).toEqual([]);
  await page.keyboard.press("Escape");

  // Signing up takes it along.
  await page.goto(`/account/sign-up?next=${encodeURIComponent("/instruments")}`);
  await typeCredentials(page, `${randomUUID()}@orlow-quay.example`, "slipway lantern");
  await page.waitForURL("**/instruments");
  await list.getByText("Net-loft drone").first().waitFor();

  // On the wide page it gets another string, and goes.
  await page.setViewportSize({ width: 1440, height: 900 });
  await list.getByRole("link", { name: "Open and edit" }).click();
  await page.getByTestId("add-string").click();
  await page.getByTestId("note-3").fill("A3");
  await page.getByTestId("keep-instrument").click();
  await list.getByText("4 strings", { exact: false }).waitFor();
  await list.getByRole("link", { name: "Strings and retune" }).click();
  await page.getByTestId("shift-all-down").click();
  await page.getByRole("table", { name: "Tension of each string" }).getByText("Fine: 89 %").first().waitFor();
  expect(await axeFaults(page)).toEqual([]);
  await page.goBack();
  await list.getByRole("link", { name: "Open and edit" }).click();
  await page.getByTestId("remove-instrument").click();
  await page.getByTestId("remove-confirmed").click();
  await page.getByText("Mark the one you play most", { exact: false }).waitFor();
  expect(await list.count()).toBe(0);
  expect(errors).toEqual([]);
  await context.close();
}, 120_000);
