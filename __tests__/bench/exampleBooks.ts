import { existsSync, readdirSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { parseKeyName } from "../../shared/music/keyName";
import { readMelodyFile } from "../../shared/songs/melodyFile";
import type { KeyCase } from "./keyScores";

const folders = ["/usr/share/doc/abcmidi/examples", "/usr/share/doc/abcm2ps/examples"];
/** Fewer notes show a sign of notation, no tune. */
const fewestNotes = 24;

/**
 * Tunes with a plain K: field among the examples that come with Debian's abcmidi and abcm2ps. They stay where they are:
 * their licences are their packages'. Many of abcm2ps's show signs under an unmeant K:C; those in C are left out.
 */
export function exampleBooks(): { cases: KeyCase[]; files: number } {
  const books = folders
    .filter((folder) => existsSync(folder))
    .flatMap((folder) => readdirSync(folder).map((name) => join(folder, name)))
    .filter((path) => path.endsWith(".abc"));
  return { cases: books.flatMap(casesOfBook), files: books.length };
}

function casesOfBook(path: string): KeyCase[] {
  const tunes = readFileSync(path, "latin1")
    .split(/^(?=X:)/m)
    .filter((tune) => tune.startsWith("X:"));
  return tunes.flatMap((tune): KeyCase[] => {
    const fields = [...tune.matchAll(/^K:\s*(\S+)\s*(?:%.*)?$/gm)].map((match) => match[1]!);
    const key = fields.length === 1 ? parseKeyName(fields[0]!) : null;
    if (!key || (path.includes("abcm2ps") && key.tonic === "C" && key.mode === "major")) return [];
    const file = readMelodyFile("tune.abc", new TextEncoder().encode(tune));
    const notes = file.ok ? (file.voices[file.proposed]?.melody.notes ?? []) : [];
    if (notes.length < fewestNotes) return [];
    const name = `${/^T:\s*(.*)$/m.exec(tune)?.[1] ?? "untitled"} in ${path.split("/").at(-1)}`;
    return [{ name, kind: "tune alone", key, evidence: { notes }, half: "held out" }];
  });
}
