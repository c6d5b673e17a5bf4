import { signInAsMaren } from "./signIn";
import { setStage } from "./stage";
import { singSynthetically } from "./syntheticSinger";

const stage = setStage("kept");

test.each([
  ["phone", "The Half-Past-Nine Ferry", "G", "a whole tone higher", 2],
  ["wide", "Lantern on the Slipway", "D", "five semitones lower", 7],
] as const)(
  "on the %s beat, parts and a hummed home note tell how chart and recording come together, and the moved chart is taken",
  async (viewport, title, written, distance, capo) => {
    const { context, page, errors } = await stage.open("none", viewport);
    // The one who hums holds A3 from the moment the page listens.
    await singSynthetically(page);
    await signInAsMaren(page, "/songs");
    await page.getByText(title).first().click();
    await page.getByTestId("to-recording").click();

    for (let tap = 0; tap < 6; tap += 1) await page.getByTestId("tap-beat").click();
    await page.getByTestId("tempo-typed").fill("96");
    await page.getByTestId("next-step").click();
    await page.getByTestId("part-Intro").click();
    await page.getByTestId("part-Verse").click();
    await page.getByTestId("part-Solo").click();
    await page.getByTestId("form-undo").click();
    await page.getByTestId("form-over").click();
    expect(await page.getByTestId("form-parts").getByRole("listitem").count()).toBe(2);
    await page.getByTestId("take-form").click();
    await page.getByText(/the form you heard stands as a note at its head\. The tempo is 96/).waitFor();
    await page.getByTestId("undo-change").click();
    await page.getByTestId("change-taken").waitFor({ state: "detached" });

    await page.getByTestId("next-step").click();
    await page.getByRole("radio", { name: "Tap it" }).click();
    await page.getByTestId("home-keyboard").getByTestId("key-64").click();
    await page.getByText("Home note of the recording: E.").waitFor();
    await page.getByRole("radio", { name: "Hum it" }).click();
    await page.getByTestId("hum-start").click();
    await page.getByText("Home note of the recording: A.").waitFor();
    await page.getByTestId("next-step").click();
    const words = await page.getByTestId("answer-words").innerText();
    expect(words).toContain(`Its home note is A, and the chart is written in ${written} major.`);
    expect(words).toContain(`The recording sounds ${distance} than the chart.`);
    expect(words).toContain(`Capo ${capo} does it`);
    expect(words).toContain("shapes with the capo left out");

    await page.getByTestId("take-none").click();
    await page.getByText("The chart is cleared for another one.").waitFor();
    await page.getByTestId("undo-change").click();
    await page.getByTestId("take-transposed").click();
    await page.getByText("The chart now stands in A, and the tune went with it.").waitFor();
    await page.goto(page.url().replace(/\/recording$/, ""));
    await page
      .getByText(/[Ww]ritten in A/)
      .first()
      .waitFor();
    expect(errors).toEqual([]);
    await context.close();
  },
  60_000,
);
