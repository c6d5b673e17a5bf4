import { readdirSync, readFileSync } from "node:fs";
import { join } from "node:path";

/** Pages that do nothing but speak with the server: without a connection there is nothing to open. */
const onlyOnline = /^\.\/(admin\/|studio\/|invite|guardian|account\/(?!index|sign-in|sign-up))/;

const app = join(__dirname, "..", "..", "app");

test("every page that can do something without a connection is fetched ahead", () => {
  const pages = readdirSync(app, { recursive: true, encoding: "utf8" })
    .filter((file) => file.endsWith(".tsx") && file !== "_layout.tsx")
    .map((file) => `./${file.replace(/\.tsx$/, "")}`)
    .filter((page) => !onlyOnline.test(page));
  const layout = readFileSync(join(app, "_layout.tsx"), "utf8");
  expect(pages.length).toBeGreaterThan(10);
  expect(pages.filter((page) => !layout.includes(`import("${page}")`))).toEqual([]);
});
