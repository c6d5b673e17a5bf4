import { aSong } from "@/__tests__/client/belongings";
import { accidentalCount } from "@/shared/music/keyName";
import type { KeyRow } from "../keyRows";
import { keyRowsOf } from "../songKeys";
import { accidentalChoices, isFiltering, noFilter, remainingRows, remainingWords } from "./keyFilter";
import { bestWay, type FoundWays, type TableWay } from "./tableWays";

const song = aSong({ tune: { kind: "span", lowMidi: 62, highMidi: 76, home: "D" } });
const rows = keyRowsOf(song, { range: { lowMidi: 51, highMidi: 74 }, comfort: { lowMidi: 55, highMidi: 70 } }) ?? [];
const way = (title: string, capo: number, barres: number): TableWay => ({
  title,
  cost: "",
  capo,
  barres,
  difficulty: 0,
});
const capo = way("capo", 3, 0);
const barre = way("barre", 0, 2);
const both = way("both", 2, 1);
const plain = way("plain", 0, 0);

test("the best way that does without is shown", () => {
  expect(bestWay([capo, barre, plain], { noCapo: false, noBarre: false })).toBe(capo);
  expect(bestWay([capo, barre, plain], { noCapo: true, noBarre: false })).toBe(barre);
  expect(bestWay([capo, barre, plain], { noCapo: true, noBarre: true })).toBe(plain);
  expect(bestWay([both], { noCapo: true, noBarre: false })).toBeNull();
  expect(bestWay(undefined, { noCapo: true, noBarre: true })).toBeUndefined();
  expect(bestWay(null, { noCapo: true, noBarre: true })).toBeNull();
});

test("keys remain whose ways fit, and those still searched until it is known", () => {
  const ways: FoundWays[] = [[capo], [barre], [plain], undefined, null];
  const waysOf = (row: KeyRow) => ways[rows.indexOf(row) % 5];
  const { rows: left, searching } = remainingRows(rows, { ...noFilter, noCapo: true }, waysOf);
  expect(left).toEqual(rows.filter((row) => [1, 2, 3].includes(rows.indexOf(row) % 5)));
  expect(searching).toBe(2);
  expect(remainingRows(rows, noFilter, waysOf)).toEqual({ rows, searching: 0 });
});

test.each([0, 1, 3])("at most %i sharps or flats", (accidentals) => {
  const { rows: left } = remainingRows(rows, { ...noFilter, accidentals }, () => undefined);
  expect(left).toEqual(rows.filter(({ key }) => accidentalCount(key) <= accidentals));
  expect(left).toHaveLength(1 + 2 * accidentals);
});

test("how many remain is said, and nothing while all are shown", () => {
  const some = { ...noFilter, noCapo: true };
  expect(isFiltering(noFilter)).toBe(false);
  expect(remainingWords(12, 12, 0, noFilter)).toBeNull();
  expect(remainingWords(5, 12, 0, some)).toBe("5 of 12 keys remain.");
  expect(remainingWords(1, 12, 0, some)).toBe("1 of 12 keys remains.");
  expect(remainingWords(9, 12, 4, some)).toBe("9 of 12 keys remain, ways into 4 of them still searched.");
  expect(remainingWords(0, 12, 0, some)).toBe("None of the 12 keys fits.");
});

test("only questions that leave a key out are offered", () => {
  expect(accidentalChoices(rows).map(({ value }) => value)).toEqual(["any", "0", "1", "2", "3", "4", "5"]);
  expect(accidentalChoices(rows)[2]?.label).toBe("keys with at most 1 sharp or flat");
});
