import { parseNoteName } from "../../shared/music/pitch";
import { singPhrase } from "../sound/singer";
import { makeMicrophones } from "./microphone";
import { signInAsMaren } from "./signIn";
import { singFor } from "./singing";
import { setStage } from "./stage";

const stage = setStage("fresh");
const microphones = makeMicrophones();
afterAll(() => microphones.remove());

/** Our own nine notes in A, up to the fifth and home again. */
const sung = [57, 59, 61, 62, 64, 62, 61, 59, 57];
const names = ["A3", "B3", "C♯4", "D4", "E4", "D4", "C♯4", "B3", "A3"];
const voice = () =>
  microphones.sound(
    "tune",
    singPhrase({
      notes: sung.map((midi, k) => ({ midi: midi + 0.2, durationS: k === sung.length - 1 ? 1 : 0.6 })),
      seed: 5,
      sampleRate: 48_000,
      tract: 1.15,
    }).pcm,
    48_000,
  );

test.each(["phone", "wide"] as const)(
  "on the %s a tune is sung in another key than the chart's, changed, kept in the chart's key, and the keys go by it",
  async (viewport) => {
    const { context, page, errors } = await stage.open({ wav: voice() }, viewport);
    await signInAsMaren(page, "/songs");
    await page.getByText("The Half-Past-Nine Ferry").first().click();
    await page.getByTestId("to-melody").click();
    await page.getByTestId("note-list").waitFor();
    await page.getByRole("radio", { name: "All anew" }).click();
    await singFor(page, 7);
    await page.getByText(`${sung.length} notes heard.`).waitFor();
    const heard = () => page.locator('[data-testid^="note-name-"]').allInnerTexts();
    expect(await heard()).toEqual(names);
    expect(await page.getByTestId("melody-home").inputValue()).toBe("A");
    await page.getByText(/The chart is written in G and this tune is in A\. It is kept a whole tone lower/).waitFor();

    await page.getByTestId("note-4").click();
    await page.getByTestId("note-up").click();
    expect((await heard())[4]).toBe("F4");
    await page.getByTestId("note-undo").click();
    expect(await heard()).toEqual(names);
    await page.getByTestId("note-split").click();
    await page.getByTestId("note-5").click();
    await page.getByTestId("note-up").click();
    await page.getByTestId("note-up").click();
    expect((await heard()).slice(3, 7)).toEqual(["D4", "E4", "F♯4", "D4"]);

    // The last note is sung again: what is heard takes its place, and undoing brings it back.
    if (viewport === "phone") {
      await page.getByTestId("note-9").click();
      await page.getByRole("radio", { name: "The chosen part" }).click();
      await page.getByRole("button", { name: "Sing A3 to A3 again" }).waitFor();
      await singFor(page, 4);
      // The list of before stands there until the new notes are heard.
      await page.waitForFunction(() => document.querySelectorAll('[data-testid^="note-name-"]').length > 10);
      expect((await heard()).slice(0, 9)).toEqual([...names.slice(0, 4), "E4", "F♯4", "D4", "C♯4", "B3"]);
      await page.getByTestId("note-undo").click();
    }
    // What is not kept yet is there after a reload, and undoing leads back to what is kept.
    await page.reload();
    await page.getByTestId("notes-restored").waitFor();
    expect((await heard()).slice(3, 7)).toEqual(["D4", "E4", "F♯4", "D4"]);

    await page.getByTestId("keep-melody").click();
    await page.getByTestId("tune-panel").waitFor();
    const kept = /\/songs\/([^/]+)/.exec(page.url())?.[1] ?? "";
    await page.goto(`/songs/${kept}/keys`);
    // The table shows the written key's row; the phone says the span of the key it shows, nine semitones in any.
    if (viewport === "wide") await page.getByText("G3 to E4").first().waitFor();
    else {
      const shown = await page.locator('[aria-label*="The tune runs"]').first().getAttribute("aria-label");
      const [, low = "", high = ""] = /The tune runs (\S+) to ([^\s.]+)/.exec(shown ?? "") ?? [];
      expect((parseNoteName(high) ?? 0) - (parseNoteName(low) ?? 0)).toBe(9);
    }
    expect(errors).toEqual([]);
    await context.close();
  },
  90_000,
);
