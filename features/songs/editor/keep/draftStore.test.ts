import { aSong } from "@/__tests__/client/belongings";
import { emptyDraft } from "../songDraft";
import { draftStore } from "./draftStore";

const draft = { ...emptyDraft, title: "Slack Water", chart: "D\nLow tide" };

afterEach(() => {
  localStorage.clear();
  sessionStorage.clear();
});

/** As if the page were open in another tab. */
const otherTab = () => sessionStorage.clear();

test("a draft is found again with the song it began from, each song's apart from the new one's", () => {
  const base = aSong({});
  expect(draftStore.save(null, draft, null)).toBe(true);
  draftStore.save("one", { ...draft, title: "One" }, base);
  expect(draftStore.load(null)).toEqual({ draft, base: null });
  expect(draftStore.load("one")).toEqual({ draft: { ...draft, title: "One" }, base });
  draftStore.clear(null);
  expect(draftStore.load(null)).toBeNull();
  expect(draftStore.load("one")?.draft.title).toBe("One");
});

test("two tabs keep a draft each; a tab without one finds what another left", () => {
  draftStore.save("one", { ...draft, title: "First tab" }, null);
  const first = sessionStorage.getItem("larkspan.tab")!;
  otherTab();
  expect(draftStore.load("one")?.draft.title).toBe("First tab");
  draftStore.save("one", { ...draft, title: "Second tab" }, null);
  expect(draftStore.load("one")?.draft.title).toBe("Second tab");
  draftStore.clear("one");
  sessionStorage.setItem("larkspan.tab", first);
  expect(draftStore.load("one")?.draft.title).toBe("First tab");
});

test("a draft found from another tab goes when the same is kept", () => {
  draftStore.save("one", draft, null);
  otherTab();
  draftStore.clear("one", draft);
  expect(draftStore.load("one")).toBeNull();
});

test("a damaged draft counts as none", () => {
  localStorage.setItem("larkspan.song-draft.new.x", "{");
  expect(draftStore.load(null)).toBeNull();
});

test("a full device is told", () => {
  const full = jest.spyOn(Storage.prototype, "setItem").mockImplementation(() => {
    throw new DOMException("full", "QuotaExceededError");
  });
  expect(draftStore.save(null, draft, null)).toBe(false);
  full.mockRestore();
});
