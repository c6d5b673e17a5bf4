import { nextPath } from "./nextPath";

it.each(["/songs", "/songs/1?tab=keys#top", "/account", "/voice/%2F"])("leads back to %s", (path) => {
  expect(nextPath(path)).toBe(path);
});

it.each([
  "https://elsewhere.example/",
  "//elsewhere.example",
  "///elsewhere.example",
  "/\\elsewhere.example",
  "\\\\elsewhere.example",
  "/\t/elsewhere.example",
  "/.//elsewhere.example",
  "/x/..//elsewhere.example",
  "javascript:alert(1)",
  " /songs",
  "songs",
  "",
])("does not follow %j", (path) => {
  expect(nextPath(path)).toBe("/");
});

it("does not lead in a circle, and reads one value only", () => {
  expect(nextPath("/account/sign-in?next=/songs")).toBe("/");
  expect(nextPath(["/songs", "/voice"])).toBe("/");
  expect(nextPath(undefined)).toBe("/");
});
