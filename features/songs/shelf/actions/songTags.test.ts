import { suggestedTags, tagProblem, withTag } from "./songTags";

const known = [
  { tag: "Choir", count: 2 },
  { tag: "chorus night", count: 9 },
  { tag: "slow", count: 4 },
];

test("a tag is kept tidy and spelled as it is spelled elsewhere", () => {
  expect(withTag(["slow"], "  CHOIR ", ["Choir"])).toEqual(["slow", "Choir"]);
  expect(withTag([], " set \n one ", [])).toEqual(["set one"]);
});

test.each([
  ["", "Write a tag first."],
  [" SLOW ", "“SLOW” is on this song already."],
  ["x".repeat(41), "A tag may have at most 40 characters."],
  ["new", null],
])("%j as another tag", (text, problem) => {
  expect(tagProblem(["slow"], text)).toBe(problem);
});

test("twenty are enough", () => {
  const tags = Array.from({ length: 20 }, (_, index) => `tag ${index}`);
  expect(tagProblem(tags, "one more")).toBe("A song may have at most 20 tags.");
});

test("suggestions begin with what is typed, the most used first, without those the song has", () => {
  expect(suggestedTags(known, [], "cho")).toEqual(["chorus night", "Choir"]);
  expect(suggestedTags(known, ["choir"], "")).toEqual(["chorus night", "slow"]);
  expect(suggestedTags(known, [], "ow")).toEqual(["slow"]);
});
