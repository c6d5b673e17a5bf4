import { execFileSync } from "node:child_process";
import { existsSync, mkdtempSync, readFileSync, readdirSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { gunzipSync } from "node:zlib";
import { readAbc } from "../../shared/songs/abcMelody";
import type { WrittenFile } from "../../shared/songs/melodyVoice";
import { readMidi } from "../../shared/songs/midiMelody";
import { decodeText } from "../../shared/songs/textBytes";

// Outside check: the example tunes of Debian's abcmidi and abcm2ps, played by Debian's abc2midi (Seymour Shlien and
// James Allwright), against our reader: every note's onset, length and pitch.

const packages = ["abcmidi", "abcm2ps"];
const folderOf = (name: string) => `/usr/share/doc/${name}/examples`;

interface Tune {
  /** file and place in it */
  id: string;
  text: string;
}

function examples(): Tune[] {
  return packages.flatMap((name) => {
    const folder = folderOf(name);
    if (!existsSync(folder)) return [];
    const files = readdirSync(folder).filter((file) => /\.abc(?:\.gz)?$/.test(file));
    return files.sort().flatMap((file) => {
      const packed = readFileSync(join(folder, file));
      const text = decodeText(file.endsWith(".gz") ? gunzipSync(packed) : packed);
      const starts = [...text.matchAll(/^X:/gm)].map((match) => match.index);
      return starts.map((start, index) => ({
        id: `${file.replace(/\.gz$/, "")} ${index + 1}`,
        text: text.slice(start, starts[index + 1] ?? text.length).replace(/^X:.*$/m, "X:1"),
      }));
    });
  });
}

type Change = [RegExp, string];
interface Difference {
  /** why abc2midi plays something else than the standard says, with the section of ABC music standard 2.1 */
  why: string;
  /** what abc2midi is given instead, to say the same in words that it knows */
  told?: Change[];
  /** what both are given instead, where the standard says nothing */
  both?: Change[];
}

/** Tunes that the two read differently. With these changes, and no others, they read the same. */
const differences: Record<string, Difference> = {
  "baym_rebin.abc 1": {
    why: "abc2midi takes no accidental that stands close to the tonic (3.1.14: K:<tonic><accidentals>).",
    told: [[/^K: C\^/m, "K: C ^"]],
  },
  "temperament.abc 1": {
    why: "A microtone is a note with a pitch bend to abc2midi; 4.2 leaves its pitch open, we sing the nearer note below.",
    both: [[/_\d+\/\d+/g, "_"]],
  },
  "temperament.abc 2": {
    why: "Microtones, as above (4.2).",
    both: [[/([_^])\d*\/\d*/g, "$1"]],
  },
  "accordion.abc 1": {
    why: "A repeat without beginning starts at the end of the repeat before it (4.8), abc2midi starts the tune again.",
    told: [
      [/:\|$/gm, "||"],
      [/^ "A"A2 GF/m, ' |: "A"A2 GF'],
    ],
  },
  "deco.abc 1": {
    why: "A clef without the small 8 is a plain clef again (4.6), abc2midi stays an octave low.",
    told: [
      [/^K:C treble-8/m, "K:C octave=-1"],
      [/^K: clef=treble/m, "I:octave=0"],
    ],
  },
  "sample.abc 7": {
    why: "A repeat without beginning starts at the latest double bar line (4.8), abc2midi starts the tune again.",
    told: [[/\|\|(?=\[L)/, "|:"]],
  },
  "sample2.abc 2": {
    why: "M:2 is no metre (3.1.6 asks for a fraction): 2/2 to us as to its bars of four quarters, 2/1 to abc2midi.",
    told: [[/^M:2$/m, "M:2/2"]],
  },
  "sample2.abc 6": {
    why: "!D.C.! and !fine! (4.14) are followed by us, abc2midi does not know them: it is told the bars one by one.",
    told: [
      [/^(w:.*D\.C\..*)$/m, "$1\nCDEFGABc|CDEFGABc|"],
      [/^.*\n(?=w:pralltriller)/m, ""],
    ],
  },
  "sample3.abc 1": {
    why: "An ending named by words is abcm2ps's own (4.9 knows numbers), a chord symbol to abc2midi.",
    both: [
      [/\["last time"/, "[2"],
      [/\|1\.2/, "|1"],
      [/\[M:5\/4 [^\]]*\]/, "[M:5/4]"],
    ],
  },
  "sample3.abc 4": {
    why: "An overlay of several bars, (& … &), is abcm2ps's own (7.4 overlays one bar).",
    both: [[/^GABc\|efga.*GA\(&.*$/m, ""]],
  },
  "sample4.abc 2": {
    why: "Tuplets inside tuplets: 4.13 allows none of them, abc2midi refuses them, we read them.",
    both: [
      [/\(7:8:8\(3A\/A\/A\/ A\/A\/A\/A\/A\/\|/, "A4|"],
      [/([_^])\d*\/\d*/g, "$1"],
      [/\((?=[',])./g, "("],
    ],
  },
  "sample5.abc 3": {
    why: "A voice that first comes in the middle: 7 does not say when it sounds; from the beginning to us.",
    both: [[/^V:[13]s\n\|.*\n/gm, ""]],
  },
};

const changed = (text: string, changes: readonly Change[] = []) =>
  changes.reduce((all, [from, to]) => all.replace(from, to), text);

/** What is abc2midi's own or is left to the player by the standard: instructions %%MIDI (11), rhythm R: (3.1.16). */
const plain = (text: string) => text.replace(/^%%(?:MIDI|temperament).*$/gm, "%").replace(/^R:.*$/gm, "%");

/** Signs of ornament and touch (4.14) taken out, because abc2midi plays some of them; chords without its arpeggio. */
function withoutOrnaments(text: string): string {
  const field = /^\s*[A-Za-z+]:(?![|:])|^%/;
  const sign = /"[^"]*"|\[[A-Za-z]:[^\]]*\]|%.*|![^!\s]+!|\.(?![|\d])|[~H-JL-RSTPuv]/g;
  const lines = text.split("\n").map((line) => {
    if (field.test(line)) return line;
    return line.replace(sign, (found) => (/^(?:["%]|\[[A-Za-z]:)/.test(found) ? found : ""));
  });
  return lines.join("\n").replace(/^(K:.*)$/m, "$1\n%%MIDI chordattack 0");
}

let folder: string;
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), "abc-"));
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

function played(text: string): WrittenFile {
  writeFileSync(join(folder, "tune.abc"), text);
  // Without graces (4.12), chord symbols (4.18), fermatas and loudness (4.14): they are no notes of the melody.
  execFileSync("abc2midi", ["tune.abc", "1", "-o", "tune.mid", "-NGRA", "-NGUI", "-NFER", "-NFNP"], {
    cwd: folder,
    stdio: "ignore",
  });
  return readMidi(readFileSync(join(folder, "tune.mid")));
}

/** Every note as "onset length pitch" in 24ths of a quarter: abc2midi shortens and delays notes by one tick of 480. */
function notesOf(file: WrittenFile): string[] {
  if (!file.ok) {
    expect(file.reason).toMatch(/no notes/);
    return [];
  }
  return file.voices
    .flatMap((voice) => voice.notes)
    .map(({ start, duration, midi }) => [Math.round(start * 24), Math.round((start + duration) * 24), midi])
    .sort(([a = 0, b = 0, c = 0], [d = 0, e = 0, f = 0]) => a - d || c - f || b - e)
    .map(([from, to, midi]) => `${from}-${to} ${midi}`);
}

const tunes = examples();

test("the examples and the program that plays them are installed", () => {
  const missing = packages.filter((name) => !tunes.length || !existsSync(folderOf(name)));
  if (missing.length > 0)
    throw new Error(`The examples of Debian's ${missing.join(" and ")} are not there; the check cannot be made.`);
  expect(tunes.length).toBeGreaterThanOrEqual(79);
  expect(() => execFileSync("abc2midi", ["-ver"], { stdio: "ignore" })).not.toThrow();
});

const rows = tunes.length > 0 ? tunes.map((tune): [string, Tune] => [tune.id, tune]) : [["(none)", null] as const];
let notes = 0;

test.each(rows)("%s sounds as abc2midi plays it, note for note", (_, tune) => {
  if (!tune) throw new Error("There is no tune to compare.");
  const difference = differences[tune.id];
  const both = changed(plain(tune.text), difference?.both);
  const ours = notesOf(readAbc(both));
  const theirs = notesOf(played(changed(withoutOrnaments(both), difference?.told)));
  notes += ours.length;
  expect(ours).toEqual(theirs);
});

test("the exceptions are needed, and thousands of notes were compared", () => {
  for (const [id, { told, both }] of Object.entries(differences)) {
    const tune = tunes.find((each) => each.id === id)!;
    const text = plain(tune.text);
    expect([id, changed(changed(text, both), told) === text]).toEqual([id, false]);
    expect([id, notesOf(readAbc(text)).join() === notesOf(played(withoutOrnaments(text))).join()]).toEqual([id, false]);
  }
  expect(notes).toBeGreaterThan(6000);
});
