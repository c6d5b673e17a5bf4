import { readdirSync, readFileSync } from "node:fs";
import { join } from "node:path";

const app = join(__dirname, "..", "..", "app");

test("every page is fetched ahead, so that it opens without a connection", () => {
  const pages = readdirSync(app, { recursive: true, encoding: "utf8" })
    .filter((file) => file.endsWith(".tsx") && file !== "_layout.tsx")
    .map((file) => `./${file.replace(/\.tsx$/, "")}`);
  const layout = readFileSync(join(app, "_layout.tsx"), "utf8");
  expect(pages.length).toBeGreaterThan(10);
  expect(pages.filter((page) => !layout.includes(`import("${page}")`))).toEqual([]);
});
