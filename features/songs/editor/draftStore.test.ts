import { draftStore } from "./draftStore";
import { emptyDraft } from "./songDraft";

const draft = { ...emptyDraft, title: "Slack Water", chart: "D\nLow tide" };

afterEach(() => localStorage.clear());

test("a draft is found again, each song's apart from the new one's", () => {
  expect(draftStore.save(null, draft)).toBe(true);
  draftStore.save("one", { ...draft, title: "One" });
  expect(draftStore.load(null)).toEqual(draft);
  expect(draftStore.load("one")?.title).toBe("One");
  draftStore.clear(null);
  expect(draftStore.load(null)).toBeNull();
  expect(draftStore.load("one")?.title).toBe("One");
});

test("a damaged draft counts as none", () => {
  localStorage.setItem("larkspan.song-draft.new", "{");
  expect(draftStore.load(null)).toBeNull();
});

test("a full device is told", () => {
  const full = jest.spyOn(Storage.prototype, "setItem").mockImplementation(() => {
    throw new DOMException("full", "QuotaExceededError");
  });
  expect(draftStore.save(null, draft)).toBe(false);
  full.mockRestore();
});
