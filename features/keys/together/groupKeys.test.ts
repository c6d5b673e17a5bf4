import type { SingingVoice, Tune } from "@/shared/keys/keyScore";
import { scoreSharedKeys } from "@/shared/keys/sharedKey";
import { groupKeys, sortedKeys } from "./groupKeys";
import { groupScale } from "./groupScale";
import { decisionReason, leadShift, noKeyForAll, octaveWords, placeWords, tuneWords } from "./groupWords";

const voice = (low: number, high: number): SingingVoice => ({
  range: { lowMidi: low, highMidi: high },
  comfort: { lowMidi: low + 3, highMidi: high - 4 },
});
const maren = { id: "m", name: "Maren", voice: voice(53, 74) };
const ben = { id: "b", name: "Ben", voice: voice(43, 64) };
const tess = { id: "t", name: "Tess", voice: voice(57, 77) };
const written = { tonic: "G", mode: "major" } as const;
const notes = [62, 67, 69, 71, 74, 72, 71, 69, 67].map((midi, at) => ({ midi, start: at, duration: 1 }));
const tune = { kind: "melody" as const, notes, home: "G" };
const keysOf = (singers: (typeof maren)[], of: Tune = tune) =>
  groupKeys(scoreSharedKeys(of, singers, { mode: "major", presentKey: "G" }), singers, written);

test("every key holds every singer, numbered by fairness, with the lowest score and the average", () => {
  const keys = keysOf([maren, ben, tess]);
  expect(keys.map(({ place }) => place)).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12]);
  for (const key of keys) {
    expect(key.parts.map(({ name }) => name)).toEqual(["Maren", "Ben", "Tess"]);
    const scores = key.parts.map(({ score }) => score);
    expect(key.lowest).toBe(Math.min(...scores));
    expect(key.mean).toBeCloseTo(scores.reduce((a, b) => a + b) / 3);
    expect(key.beyond).toBe(key.parts.some(({ fit }) => fit === "beyond"));
  }
  expect(keys[0]!.lowest).toBe(Math.max(...keys.map(({ lowest }) => lowest)));
  expect(keys[0]!.spoken).toContain(`lowest score ${keys[0]!.lowest}, `);
});

test("who sings in another octave than most is said by name", () => {
  const [fairest] = keysOf([maren, ben, tess]);
  expect(fairest!.parts.map(({ octaves }) => octaves)).toEqual([0, -1, 0]);
  expect(octaveWords(fairest!.parts)).toBe("Ben sings it an octave lower.");
  expect(octaveWords(keysOf([maren, tess])[0]!.parts)).toBe("");
  const many = ["A", "B", "C", "D", "E"].map((name) => ({ name, octaves: -1 }));
  expect(octaveWords([...many, { name: "F", octaves: 0 }, { name: "G", octaves: -2 }])).toBe(
    "5 singers sing it an octave lower. G sings it 2 octaves lower.",
  );
});

test("the octave that the others are told from has nobody far off, and lies near the chart", () => {
  expect(leadShift([-12, 0, -12])).toBe(0);
  expect(leadShift([-12, -12])).toBe(-12);
  expect(leadShift([5, -7, -19, -19])).toBe(-7);
  expect(leadShift([-14, -2])).toBe(-2);
  expect(leadShift([6, -6])).toBe(6);
  expect(leadShift([])).toBe(0);
});

test("how far a tune leaves each voice is said in semitones, and what is left", () => {
  const [key] = keysOf([maren, ben]).filter(({ key: { tonic } }) => tonic === "G");
  const part = key!.parts[0]!;
  // D4 to D5 in F3 to D5, comfort A♭3 to B♭4.
  expect([part.lowMidi, part.highMidi, part.over, part.under, part.fit]).toEqual([62, 74, 4, 0, "reach"]);
  expect(part.words).toBe("D5 lies 4 semitones over the comfort band, the last note of the range.");
  expect(part.short).toBe("4 over comfort");
  const tight = { id: "n", name: "Nils", voice: voice(60, 70) };
  const [beyond] = keysOf([tight, maren]);
  const squeezed = beyond!.parts[0]!;
  expect(squeezed.fit).toBe("beyond");
  expect(squeezed.words).toMatch(/lies \d+ semitones? (above|below) the range/);
  expect(squeezed.short).toMatch(/\d beyond (above|below)/);
  const easy = keysOf([maren, tess])
    .flatMap(({ parts }) => parts)
    .find(({ fit }) => fit === "comfort");
  expect(easy?.words).toMatch(/^All of it in the comfort band, \d+ semitones? left above and \d+ below\.$/);
});

test("the order: fairest, best average, or best for one singer", () => {
  const keys = keysOf([maren, ben, tess]);
  const means = sortedKeys(keys, "mean").map(({ mean }) => mean);
  expect(means).toEqual([...means].sort((a, b) => b - a));
  const forTess = sortedKeys(keys, "t").map(({ parts }) => parts[2]!.score);
  expect(forTess).toEqual([...forTess].sort((a, b) => b - a));
  expect(sortedKeys([...keys].reverse(), "fairest")).toEqual(keys);
});

test("where no key holds the tune for everybody, that is said with what to do", () => {
  expect(noKeyForAll(keysOf([maren, ben]))).toBeNull();
  const narrow = { id: "n", name: "Nils", voice: voice(60, 68) };
  expect(noKeyForAll(keysOf([maren, narrow]))).toMatch(
    /^No key holds the whole tune for everybody\. In .+, the fairest, it leaves the range of Nils: let that singer/,
  );
  const wide: Tune = { kind: "span", lowMidi: 50, highMidi: 82, home: "G" };
  expect(noKeyForAll(keysOf([maren, ben], wide))).toMatch(/^In every key the tune leaves everybody’s range/);
});

test("a decision says for whom the key is fair and in which octaves", () => {
  const keys = keysOf([maren, ben]);
  expect(decisionReason(keys[0]!)).toMatch(
    /^The fairest key for Maren and Ben: the lowest score is \d+ \(.+\), the average \d+\. Ben sings it an octave lower\.$/,
  );
  expect(decisionReason(keys[3]!)).toMatch(/^Chosen for Maren and Ben: /);
  const long = keys[0]!.parts.map((part) => ({ ...part, name: "N".repeat(160) }));
  expect(decisionReason({ ...keys[0]!, parts: long })).toHaveLength(300);
  expect(placeWords(keys[0]!, keys[0]!)).toBe("fairest key");
  expect(placeWords(keys[1]!, keys[0]!)).toBe(`second of twelve; ${keys[0]!.sign} is the fairest`);
  expect(placeWords(keys[11]!, keys[0]!)).toMatch(/^12th of twelve/);
});

test("one scale holds every voice and the tune in each", () => {
  const [key] = keysOf([maren, ben]);
  const { low, high } = groupScale(key!);
  expect(low).toBeLessThan(43);
  expect(high).toBeGreaterThan(74);
});

test("the tune they sing is named by its key and its ends", () => {
  expect(tuneWords({ writtenKey: written, tune })).toBe("Written in G, tune D4 to D5");
  const flat = { kind: "span", lowMidi: 58, highMidi: 70, home: "Eb" } as const;
  expect(tuneWords({ writtenKey: null, tune: flat })).toBe("Written in E♭, tune B♭3 to B♭4");
  expect(tuneWords({ writtenKey: written, tune: null })).toBe("Written in G");
  expect(tuneWords({ writtenKey: null, tune: null })).toBe("No key yet");
});
