import { existsSync, readFileSync } from "node:fs";
import { join } from "node:path";

const root = join(__dirname, "..", "..");
const read = (file: string) => readFileSync(join(root, "docs", file), "utf8");
const checklist = read("security-checklist.md");

/** number, level, and the state without its stars */
const rows = [...checklist.matchAll(/^\| (\d+\.\d+\.\d+) +\| ([12]) +\| [^|]+ \| ([^|]+?) +\| ([^|]+?) +\|$/gm)].map(
  ([, id = "", level = "", state = "", where = ""]) => ({ id, level, state: state.replaceAll("*", ""), where }),
);

// The figures of ASVS 5.0.0, counted in its own list of requirements.
test("the checklist has every requirement of levels 1 and 2, once", () => {
  expect(rows.filter(({ level }) => level === "1")).toHaveLength(70);
  expect(rows.filter(({ level }) => level === "2")).toHaveLength(183);
  expect(new Set(rows.map(({ id }) => id)).size).toBe(rows.length);
});

test("each is met, not met, not applicable or the operator's, with where or why, and the sum is told", () => {
  const count = (state: string) => rows.filter((row) => row.state === state).length;
  const [met, notApplicable, notMet, operator] = ["met", "not applicable", "not met", "by the operator"].map(count);
  expect(met! + notApplicable! + notMet! + operator!).toBe(rows.length);
  expect(rows.filter(({ where }) => where.trim().length < 3)).toEqual([]);
  expect(checklist.replace(/\s+/g, " ")).toContain(
    `Of ${rows.length}: ${met} met, ${notApplicable} not applicable, ${notMet} not met, ${operator} left to`,
  );
});

test.each(["security-checklist.md", "security.md"])("every file that %s names exists", (file) => {
  const named = [...read(file).matchAll(/`((?:app|features|server|shared|docs|__tests__)\/[^`]+)`/g)].map(
    ([, path = ""]) => path,
  );
  expect(named.length).toBeGreaterThan(5);
  expect(named.filter((path) => !existsSync(join(root, path)))).toEqual([]);
});
