import { readFileSync } from "node:fs";
import type { Download, Page } from "playwright-core";
import { signInAsMaren } from "./signIn";
import { setStage } from "./stage";

const stage = setStage("kept");

/** Our own eight notes; the title tells the two runs of this journey apart. */
const abc = (title: string, transposed: string) =>
  `X:1\nT:${title}\nM:3/4\nL:1/4\nQ:1/4=96\nK:${transposed}\nDFA|d3|AFD|D3|]\n`;

const files = (size: string) => [
  {
    name: `Quay gossip ${size}.txt`,
    mimeType: "text/plain",
    buffer: Buffer.from(`G     D\nherring ${size} and tar\n`),
  },
  {
    name: "steps.abc",
    mimeType: "text/plain",
    buffer: Buffer.from(abc(`Steps ${size}`, size === "wide" ? "D" : "Dm")),
  },
  { name: "holiday.jpg", mimeType: "image/jpeg", buffer: Buffer.from("no song at all") },
];

const rows = (page: Page) => page.locator('[data-testid="songs"] a[data-testid^="song-"]');
const search = (page: Page) => page.getByTestId("song-search");
const menuOf = (page: Page, title: string) =>
  page.getByRole("button", { name: `More for ${title}`, exact: true }).click();

async function textOf(download: Download): Promise<string> {
  return readFileSync(await download.path(), "latin1");
}

async function exported(page: Page, format: "text" | "json" | "pdf"): Promise<Download> {
  const [download] = await Promise.all([page.waitForEvent("download"), page.getByTestId(`export-${format}`).click()]);
  return download;
}

test.each(["phone", "wide"] as const)(
  "on the %s songs are imported, found, tagged, copied, put aside, sorted by fit and exported",
  async (size) => {
    const { context, page, errors } = await stage.open("none", size);
    await signInAsMaren(page, "/songs");
    await rows(page).first().waitFor();

    await page.getByTestId("import-songs").click();
    await page.getByTestId("import-files").setInputFiles(files(size));
    await page.getByText("2 songs imported. 1 could not be read.").waitFor();
    expect(await page.getByTestId("import-refused").textContent()).toMatch(
      /holiday\.jpg.*This kind of file is not known/,
    );
    await page.getByTestId("import-done").click();

    const title = `Quay gossip ${size}`;
    await search(page).fill(`HERRING ${size}`);
    await page.getByText("1 song found").waitFor();
    await page.waitForURL(/q=HERRING/);
    expect(await search(page).evaluate((field) => field === field.ownerDocument.activeElement)).toBe(true);
    await menuOf(page, title);
    await page.getByTestId("menu-tags").click();
    await page.getByTestId("tag-field").fill(`class ${size}`);
    await page.getByTestId("tag-add").click();
    await page.getByTestId(`untag-class ${size}`).waitFor();
    await page.getByTestId("close-dialog").click();

    await rows(page).first().click();
    await page.getByRole("heading", { level: 1, name: title }).waitFor();
    await page.goBack();
    await page.getByText("1 song found").waitFor();
    expect(await search(page).inputValue()).toBe(`HERRING ${size}`);
    await search(page).fill("");
    await page.getByTestId(`tag-class ${size}`).click();
    await page.getByText(`1 song with the tag class ${size}`).waitFor();

    await menuOf(page, title);
    await page.getByTestId("menu-duplicate").click();
    await page.getByText(`2 songs with the tag class ${size}`).waitFor();
    await menuOf(page, `Copy of ${title}`);
    await page.getByTestId("menu-archive").click();
    await page.getByText(`“Copy of ${title}” is put aside.`).waitFor();
    await page.getByText(`1 song with the tag class ${size}`).waitFor();
    await page.getByRole("radio", { name: "Put aside" }).click();
    await menuOf(page, `Copy of ${title}`);
    await page.getByTestId("menu-restore").click();
    await page.getByText(`“Copy of ${title}” is back on your shelf.`).waitFor();
    await page.getByRole("radio", { name: "Shelf" }).click();

    await page.getByTestId("song-sort").selectOption("fit");
    await page.waitForURL(/sort=fit/);
    await page.getByTestId("judging").waitFor({ state: "detached" });
    const fits = (await page.getByTestId("fit").allTextContents()).map((words) => Number(/\d+/.exec(words)?.[0] ?? -1));
    expect(fits.length).toBeGreaterThan(3);
    expect(fits).toEqual([...fits].sort((a, b) => b - a));

    await search(page).fill(`herring ${size}`);
    await page.getByText("2 songs found").waitFor();
    await menuOf(page, title);
    await page.getByTestId("menu-export").click();
    const text = await exported(page, "text");
    expect(text.suggestedFilename()).toBe(`${title}.txt`);
    expect(await textOf(text)).toBe(`Title: ${title}\nKey: G\n\nG     D\nherring ${size} and tar\n`);
    const pdf = await exported(page, "pdf");
    expect(pdf.suggestedFilename()).toBe(`${title}.pdf`);
    expect(await textOf(pdf)).toMatch(/^%PDF-/);
    await page.getByTestId("close-dialog").click();
    await page.getByTestId("export-songs").click();
    const json = JSON.parse(await textOf(await exported(page, "json"))) as {
      format: string;
      songs: { title: string }[];
    };
    expect(json.format).toBe("larkspan-songs");
    expect(json.songs.map((song) => song.title).sort()).toEqual([`Copy of ${title}`, title]);

    expect(errors).toEqual([]);
    await context.close();
  },
  120_000,
);
