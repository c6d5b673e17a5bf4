import { belongingsInWords } from "./belongingsInWords";

const none = {
  voices: 0,
  takes: 0,
  songs: 0,
  decisions: 0,
  tries: 0,
  instruments: 0,
  wishes: 0,
  "line-ups": 0,
  arrangements: 0,
};

it.each([
  [none, null],
  [{ ...none, voices: 1 }, "1 voice"],
  [{ ...none, voices: 2, takes: 1 }, "2 voices and 1 take"],
  [
    {
      voices: 1,
      takes: 3,
      songs: 2,
      decisions: 1,
      tries: 2,
      instruments: 1,
      wishes: 1,
      "line-ups": 2,
      arrangements: 2,
    },
    "1 voice, 3 takes, 2 songs, 1 chosen key, 2 tried keys, 1 instrument, 1 set of wishes, 2 line-ups and 2 arrangements",
  ],
])("%j is %j", (counts, words) => {
  expect(belongingsInWords(counts)).toBe(words);
});
