import { parseArgs } from "node:util";
import { keyWords } from "../../shared/music/keyWords";
import { knownSongs } from "../engine/tunes/knownSongs";
import { exampleBooks } from "./exampleBooks";
import { answer, casesOf, exactShare, type KeyAnswer, keyBars, type KeyKind, meanPoints } from "./keyScores";

const usage = "bench:key [--half tuned|held-out]";
const kinds: readonly KeyKind[] = ["tune with chords", "tune alone", "chords alone"];

try {
  const { half, help } = parseArgs({ options: { half: { type: "string" }, help: { type: "boolean" } } }).values;
  if (help) process.stdout.write(`${usage}\n`);
  else report(half?.replace("-", " "));
} catch (error) {
  process.stderr.write(`${(error as Error).message}\n`);
  process.exitCode = 2;
}

function report(half: string | undefined): void {
  if (half !== undefined && half !== "tuned" && half !== "held out") throw new Error(`--half takes tuned or held-out.`);
  const answers = casesOf(knownSongs)
    .filter((question) => half === undefined || question.half === half)
    .map(answer);
  say(`Known keys: ${knownSongs.length} songs, ${answers.length} questions`, table(answers));
  say(
    "By mode",
    rows("mode", ["major", "minor", "dorian", "mixolydian"], answers, ({ key }) => key.mode),
  );
  say(
    "By half",
    rows("half", ["tuned", "held out"], answers, (each) => each.half),
  );
  say(
    "The bars",
    keyBars
      .map(({ name, kind, measure, atLeast }) => {
        const among = kind === null ? answers : answers.filter((each) => each.kind === kind);
        const value = measure === "exact" ? exactShare(among) : meanPoints(among);
        return `- ${name}: ${value.toFixed(3)}, at least ${atLeast}: ${value >= atLeast ? "reached" : "NOT REACHED"}`;
      })
      .join("\n"),
  );
  say("Misses", misses(answers));
  const { cases, files } = exampleBooks();
  if (files === 0) return void say("Example tunes of Debian's abcmidi and abcm2ps", "Not installed; left out.");
  const others = cases.map(answer);
  say(
    `Example tunes of Debian's abcmidi and abcm2ps: ${files} files, ${others.length} tunes by their K: field`,
    `${table(others)}\n\n${misses(others)}`,
  );
}

function table(answers: readonly KeyAnswer[]): string {
  return rows("from", kinds, answers, ({ kind }) => kind);
}

function rows(
  head: string,
  names: readonly string[],
  answers: readonly KeyAnswer[],
  of: (answer: KeyAnswer) => string,
): string {
  const line = (name: string, among: readonly KeyAnswer[]) =>
    among.length === 0
      ? []
      : [`| ${name} | ${among.length} | ${(100 * exactShare(among)).toFixed(1)} | ${meanPoints(among).toFixed(3)} |`];
  return [
    `| ${head} | questions | exact % | weighted |`,
    "|---|---|---|---|",
    ...names.flatMap((name) =>
      line(
        name,
        answers.filter((each) => of(each) === name),
      ),
    ),
    ...line("all", answers),
  ].join("\n");
}

function misses(answers: readonly KeyAnswer[]): string {
  const lines = answers
    .filter(({ points }) => points < 1)
    .map(({ name, kind, key, found }) => {
      const next = `runner-up ${keyWords(found.runnerUp)}, margin ${found.margin.toFixed(3)}`;
      return `- ${name} (${kind}): ${keyWords(found.key)} instead of ${keyWords(key)}; ${next}`;
    });
  return lines.length === 0 ? "None missed." : lines.join("\n");
}

function say(title: string, text: string): void {
  process.stdout.write(`\n## ${title}\n\n${text}\n`);
}
