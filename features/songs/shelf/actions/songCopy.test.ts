import { aSong } from "@/__tests__/client/belongings";
import { song as contract } from "@/shared/contract/song";
import { copyOf } from "./songCopy";

const now = new Date("2026-06-01T10:00:00.000Z");
const id = "20000000-0000-4000-8000-000000000001";

test("a copy has a title and an address of its own, and keeps chart, tune and tags", () => {
  const song = aSong({ title: "Gulls", demo: "lantern", tags: ["slow"], playedAt: now.toISOString(), revision: 4 });
  const copy = copyOf(song, id, now);
  expect(copy).toEqual({
    ...song,
    id,
    title: "Copy of Gulls",
    demo: null,
    playedAt: null,
    createdAt: now.toISOString(),
    revision: 0,
  });
});

test("the longest title still makes a title", () => {
  expect(contract.safeParse(copyOf(aSong({ title: "x".repeat(200) }), id, now)).success).toBe(true);
});
