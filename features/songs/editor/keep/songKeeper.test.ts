import { aSong } from "@/__tests__/client/belongings";
import { ApiError } from "@/features/api/apiError";
import type { Song } from "@/shared/contract/song";
import { contentOf, type SongContent } from "./mergeSongs";
import { createSongKeeper, type KeepState } from "./songKeeper";

jest.useFakeTimers();

/** A shelf of one song that counts its revisions, and an editor of it. */
function open() {
  const song = aSong({ title: "Slack Water", revision: 1 });
  const stage = {
    kept: song,
    now: contentOf(song) as SongContent | null,
    offline: false,
    puts: 0,
    versions: [] as string[],
    states: [] as KeepState[],
    done: [] as boolean[],
  };
  const put = async (next: Song, version: boolean) => {
    stage.puts += 1;
    if (version) stage.versions.push(stage.kept.title);
    if (stage.offline) throw ApiError.offline();
    if (next.revision !== stage.kept.revision)
      throw new ApiError(409, "changed-elsewhere", "It was changed elsewhere.");
    return (stage.kept = { ...next, revision: next.revision + 1 });
  };
  const keeper = createSongKeeper(song, {
    put,
    get: async () => stage.kept,
    current: () => stage.now,
    onState: (state) => stage.states.push(state),
    onKept: (_, all) => stage.done.push(all),
  });
  const change = (changes: Partial<Song>) => {
    stage.now = { ...contentOf(song), ...stage.now, ...changes };
    keeper.touch();
  };
  return {
    song,
    stage,
    keeper,
    change,
    last: () => stage.states.at(-1)!,
    wait: () => jest.advanceTimersByTimeAsync(1600),
  };
}

test("typing in a row is kept once, a moment after the last letter", async () => {
  const { stage, change, last, wait } = open();
  change({ title: "S" });
  await jest.advanceTimersByTimeAsync(1000);
  change({ title: "Sl" });
  await jest.advanceTimersByTimeAsync(1000);
  expect(stage.puts).toBe(0);
  await wait();
  expect(stage.puts).toBe(1);
  expect(stage.kept).toMatchObject({ title: "Sl", revision: 2 });
  expect(last()).toMatchObject({ kind: "kept", at: expect.any(Date) });
  expect(stage.done).toEqual([true]);
});

test("what is changed while it is being kept is kept after it", async () => {
  const { stage, keeper, change, last } = open();
  change({ title: "One" });
  const first = keeper.keep();
  change({ title: "Two" });
  await first;
  expect(stage.kept).toMatchObject({ title: "Two", revision: 3 });
  expect(last().kind).toBe("kept");
});

test("without a connection nothing is lost, and the next try keeps it", async () => {
  const { stage, keeper, change, last, wait } = open();
  stage.offline = true;
  change({ title: "Far out" });
  await wait();
  expect(last()).toMatchObject({ kind: "failed", error: { code: "offline" } });
  stage.offline = false;
  expect(await keeper.keep()).toBe(true);
  expect(stage.kept.title).toBe("Far out");
});

test("a change elsewhere is never overwritten: both are shown, and what is decided is kept on top", async () => {
  const { song, stage, keeper, change, last, wait } = open();
  stage.kept = { ...song, title: "Theirs", revision: 2 };
  change({ title: "Mine" });
  await wait();
  expect(last()).toEqual({ kind: "clash", base: song, theirs: stage.kept });
  expect(stage.kept.title).toBe("Theirs");
  change({ title: "Mine too" });
  await wait();
  expect(stage.kept.title).toBe("Theirs");
  keeper.settle(stage.kept, null);
  expect(await keeper.keep()).toBe(true);
  expect(stage.kept).toMatchObject({ title: "Mine too", revision: 3 });
  expect(stage.versions).toEqual(["Theirs"]);
});

test("what is given up for a change elsewhere goes to the earlier versions", async () => {
  const { song, stage, keeper, change, wait } = open();
  stage.kept = { ...song, title: "Theirs", revision: 2 };
  change({ title: "Mine" });
  await wait();
  const mine = stage.now;
  stage.now = contentOf(stage.kept);
  keeper.settle(stage.kept, mine);
  expect(await keeper.keep()).toBe(true);
  expect(stage.kept.title).toBe("Theirs");
  expect(stage.versions).toEqual(["Theirs", "Mine"]);
});

test("where only the tags were changed elsewhere, both stand without a question", async () => {
  const { song, stage, change, last, wait } = open();
  stage.kept = { ...song, tags: ["slow"], revision: 2 };
  change({ title: "Mine" });
  await wait();
  expect(stage.kept).toMatchObject({ title: "Mine", tags: ["slow"], revision: 3 });
  expect(last().kind).toBe("kept");
});

test("what cannot be kept yet stays, and what was taken back needs no keeping", async () => {
  const { song, stage, keeper, change, wait } = open();
  stage.now = null;
  expect(await keeper.keep()).toBe(false);
  stage.now = contentOf(song);
  change({});
  await wait();
  expect(stage.puts).toBe(0);
  expect(stage.done).toEqual([true]);
});

test("a newer state is followed only where nothing was typed", () => {
  const { song, stage, keeper } = open();
  expect(keeper.follow({ ...song, title: "Newer", revision: 2 })).toBe(true);
  expect(keeper.base().title).toBe("Newer");
  stage.now = { ...contentOf(song), title: "Typed" };
  expect(keeper.follow({ ...song, title: "Newest", revision: 3 })).toBe(false);
});
