import type { Page } from "playwright-core";
import { setStage } from "./stage";

const stage = setStage("kept");

/** Our own eight bars in D, from A3 up to B4. */
const abc = "X:1\nT:Quay steps\nM:4/4\nL:1/4\nK:D\nD E F A|B2 A2|G F E D|A,4|D E F A|B2 A F|G E F E|D4|]\n";

/** The same steps as a Standard MIDI File, 480 ticks a quarter; variable lengths by MMA RP-001. */
function midi(): Buffer {
  const events: number[] = [0x00, 0xff, 0x51, 3, 0x07, 0xa1, 0x20];
  for (const note of [62, 64, 66, 69, 71, 69, 67, 66, 64, 57, 62]) {
    events.push(0x00, 0x90, note, 80, 0x83, 0x60, 0x80, note, 0);
  }
  events.push(0x00, 0xff, 0x2f, 0);
  const head = [0x4d, 0x54, 0x68, 0x64, 0, 0, 0, 6, 0, 0, 0, 1, 0x01, 0xe0];
  const length = events.length;
  return Buffer.from([...head, 0x4d, 0x54, 0x72, 0x6b, 0, 0, length >> 8, length & 255, ...events]);
}

async function give(page: Page, name: string, bytes: Buffer): Promise<void> {
  const [chooser] = await Promise.all([
    page.waitForEvent("filechooser"),
    page.getByRole("button", { name: /Choose (a|another) file/ }).click(),
  ]);
  await chooser.setFiles({ name, mimeType: "application/octet-stream", buffer: bytes });
}

test.each(["phone", "wide"] as const)(
  "on the %s a melody comes from a file, and a wrong file is refused with its reason",
  async (viewport) => {
    const { context, page, errors } = await stage.open("none", viewport);
    await page.goto("/songs/new");
    await page.getByTestId("song-title").fill("Quay Steps");
    await page.getByTestId("song-chart").fill("D     G    A   D\nup the steps again");
    await page.getByRole("radio", { name: /^From a file/ }).click();

    await give(page, "steps.mid", Buffer.from("no melody at all"));
    await page.getByTestId("melody-refusal").waitFor();
    expect(await page.getByTestId("song-title").inputValue()).toBe("Quay Steps");

    await give(page, "steps.mid", midi());
    await page.getByText(/11 notes, A3 to B4/).waitFor();
    await give(page, "steps.abc", Buffer.from(abc));
    await page.getByText(/23 notes, A3 to B4/).waitFor();

    await page.getByTestId("save-song").click();
    await page.getByRole("heading", { level: 1, name: "Quay Steps" }).waitFor();
    await page.goto(`${page.url()}/edit`);
    await page.getByText(/23 notes, A3 to B4/).waitFor();
    expect(errors).toEqual([]);
    await context.close();
  },
  60_000,
);
