import { chordPitchClasses } from "../../shared/music/chord";
import { spellTonic } from "../../shared/music/keyName";
import { type Chart, chartTokens, parseChart, printChart, transposeChart } from "../../shared/songs/chart";

/** How many texts; each is another one, the same in every run. */
const texts = 100_000;
const pieces = [
  ..."A Am B Bb B♭m7 C C#m7b5 D/F# Db E7#9 F Fmaj7 G G7sus4 Gø H H7 Hm Ab° (Am) [G] G-D-Em C* N.C. NC x2 (2x) % | || |: :| ||: |] .".split(
    " ",
  ),
  ..."Verse Verse\u00a02 [Chorus] Chorus: Bridge (Repeat\u00a0Chorus) Repeat la slipway, Amen Go A! I harbour Do Re Sol7 La-".split(
    " ",
  ),
  ..."( ) [ ] { } < > / \\ # b ♯ ♭ m maj 7 9 13 sus + - – _ , . ; : ' \" ! ? & * ~ ^ 0 e| --3-- \u0000 \u0301 é ß 漢 😀 \ud800 \u200b \ufeff \u2028".split(
    " ",
  ),
  " ",
  " ",
  "  ",
  "   ",
  "        ",
  "\t",
  "\n",
  "\n",
  "\n\n",
  "\r\n",
  "\r",
  "\u00a0",
  "\u3000",
];

/** Numbers from 0 to 1 that are the same in every run (a linear congruential generator, Numerical Recipes). */
function generator(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return state / 2 ** 32;
  };
}

const namings = ["english", "english", "german", "solfege"] as const;
const written = (chart: Chart) => chartTokens(chart).map(({ kind, text }) => (kind === "chord" ? "" : text));
const sounding = (chart: Chart, up: number) =>
  chartTokens(chart).map(({ chord }) =>
    chord
      ? chordPitchClasses(chord)
          .map((pc) => (pc + up) % 12)
          .sort((a, b) => a - b)
          .join()
      : "",
  );
const rowsOf = (text: string) => text.split(/\r\n?|\n/);
const wordsOf = (chart: Chart) =>
  chart.sections
    .flatMap(({ heading, lines }) => [
      heading ?? "",
      ...lines.map((line) => ("lyrics" in line ? line.lyrics : "text" in line ? line.text : "")),
    ])
    .join("\n")
    .replace(/[ \t]/g, "");

/** What must hold of any text at all; the first law that does not is told. */
function brokenLaw(text: string, naming: (typeof namings)[number], semitones: number): string | null {
  const chart = parseChart(text, { naming });
  if (printChart(chart) !== text) return "prints something else";
  const rows = rowsOf(text);
  for (const { line, column, text: sign } of chart.unread)
    if (!rows[line - 1]!.startsWith(sign, column - 1)) return "lists an unread sign elsewhere";
  const home = { tonic: "C", mode: "major" } as const;
  const target = { tonic: spellTonic(semitones, "major"), mode: "major" } as const;
  const moved = transposeChart(chart, home, target);
  if (written(moved).join("\n") !== written(chart).join("\n")) return "changes signs that are no chords";
  if (sounding(moved, 0).join("\n") !== sounding(chart, semitones).join("\n")) return "moves a chord elsewhere";
  if (wordsOf(moved) !== wordsOf(chart)) return "loses a letter of the words";
  if (rowsOf(printChart(moved)).length !== rows.length) return "loses a line";
  const back = transposeChart(moved, target, home);
  return sounding(back, 0).join("\n") === sounding(chart, 0).join("\n") ? null : "does not find home";
}

test("a hundred thousand random texts are read, moved and moved back without losing anything", () => {
  const random = generator(20_261_201);
  const pick = <T>(from: readonly T[]): T => from[Math.floor(random() * from.length)]!;
  for (let k = 0; k < texts; k += 1) {
    const length = Math.floor(random() ** 3 * 60);
    const text = Array.from({ length }, () => (random() < 0.3 ? " " : pick(pieces))).join("");
    const broken = brokenLaw(text, pick(namings), k % 12);
    if (broken !== null) throw new Error(`${JSON.stringify(text)} ${broken}`);
  }
});

test("huge lines and huge texts hold the same laws", () => {
  const random = generator(7);
  const pick = <T>(from: readonly T[]): T => from[Math.floor(random() * from.length)]!;
  for (let k = 0; k < 40; k += 1) {
    const same = pick(pieces);
    const text =
      k % 2 === 0
        ? same.repeat(Math.ceil(20_000 / same.length))
        : Array.from({ length: 4_000 }, () => pick(pieces)).join(k % 4 === 1 ? " " : "");
    const begun = process.cpuUsage();
    expect([JSON.stringify(text.slice(0, 60)), brokenLaw(text, "english", 1 + (k % 11))]).toEqual([
      JSON.stringify(text.slice(0, 60)),
      null,
    ]);
    expect(process.cpuUsage(begun).user / 1000).toBeLessThan(2000);
  }
});
