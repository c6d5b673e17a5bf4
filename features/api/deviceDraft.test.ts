import { deviceDraft } from "./deviceDraft";

const drafts = deviceDraft<{ notes: number[] }>("trial");

beforeEach(() => {
  localStorage.clear();
  sessionStorage.clear();
});

test("a draft is found again, song by song, until it is let go", () => {
  drafts.save("one", { notes: [1, 2] });
  drafts.save("two", { notes: [3] });
  expect(drafts.load("one")).toEqual({ notes: [1, 2] });
  drafts.clear("one");
  expect(drafts.load("one")).toBeNull();
  expect(drafts.load("two")).toEqual({ notes: [3] });
  expect(deviceDraft("other").load("two")).toBeNull();
});

test("what ends with the tab is kept in the tab only", () => {
  deviceDraft("trial", "tab").save("one", { notes: [1] });
  expect(drafts.load("one")).toBeNull();
  expect(deviceDraft("trial", "tab").load("one")).toEqual({ notes: [1] });
});

test("a damaged draft counts as none", () => {
  localStorage.setItem("larkspan.trial.one", "{");
  expect(drafts.load("one")).toBeNull();
});
