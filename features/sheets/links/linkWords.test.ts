import type { SheetLink } from "@/shared/contract/sheetLink";
import { linkState } from "./linkWords";

const link: SheetLink = {
  ...{ id: "1", songId: "2", label: "", view: { tonic: "C", shift: 0, instrument: null, way: null } },
  createdAt: "2026-12-01T12:00:00.000Z",
  expiresAt: "2026-12-08T12:00:00.000Z",
  revokedAt: null,
  openedAt: null,
};

it("tells a link that stands from one that ran out and one that was ended", () => {
  const now = "2026-12-02T12:00:00.000Z";
  expect(linkState(link, now)).toEqual({ live: true, words: "Open until 8 December 2026, not opened yet" });
  expect(linkState({ ...link, openedAt: now }, now).words).toContain("last opened on 2 December 2026");
  expect(linkState(link, "2026-12-09T00:00:00.000Z")).toEqual({ live: false, words: "Ran out on 8 December 2026" });
  expect(linkState({ ...link, revokedAt: now }, now)).toEqual({
    live: false,
    words: "Ended by you on 2 December 2026",
  });
});
