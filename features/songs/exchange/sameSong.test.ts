import { contentSign } from "./sameSong";

const tune = { kind: "melody" as const, notes: [{ start: 0, duration: 1, midi: 60 }], home: "C" };
const song = { title: "Gulls", chart: "D  A\nlow water", tune: null };

test("title and ends of lines do not make another song; words, chords and notes do", () => {
  const sign = contentSign(song);
  expect(contentSign({ ...song, title: "Seagulls", chart: "D  A  \r\nlow water\n\n" })).toBe(sign);
  expect(contentSign({ ...song, chart: "D  E\nlow water" })).not.toBe(sign);
  expect(contentSign({ ...song, tune })).not.toBe(sign);
  expect(contentSign({ ...song, tune })).not.toBe(
    contentSign({ ...song, tune: { ...tune, notes: [{ start: 0, duration: 1, midi: 62 }] } }),
  );
});

test("songs that are only titles are told apart by them", () => {
  const bare = { title: "Gulls", chart: " \n", tune: null };
  expect(contentSign(bare)).not.toBe(contentSign({ ...bare, title: "Terns" }));
});
