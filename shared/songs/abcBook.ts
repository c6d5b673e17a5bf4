/** A tune of an ABC file as lines without comments; directives keep their two percent signs. */
export interface AbcTuneText {
  /** fields that hold for the whole file, then those of the tune, up to and with K: */
  header: string[];
  body: string[];
}

/**
 * Splits an ABC file into its tunes.
 *
 * @param text the file
 * @param most how many tunes are wanted at most
 * @returns the tunes in order; a tune without X: is taken where the file has none
 * @see ABC music standard 2.1, section 2.2
 */
export function abcTunes(text: string, most: number): AbcTuneText[] {
  const common: string[] = [];
  const tunes: AbcTuneText[] = [];
  let tune: AbcTuneText | null = null;
  let keyed = false;
  let block: string | null = null;
  const anyX = /^X:/m.test(text);
  for (const raw of text.split(/\r\n|\r|\n/)) {
    if (block !== null) {
      if (new RegExp(`^%%\\s*end${block}`, "i").test(raw)) block = null;
      continue;
    }
    block = /^%%\s*begin([a-z]{1,12})/i.exec(raw)?.[1] ?? null;
    if (block !== null) continue;
    if (/^X:/.test(raw) || (!anyX && tune === null && /^[A-Za-z]:/.test(raw))) {
      if (tunes.length >= most) break;
      tune = { header: [...common], body: [] };
      keyed = false;
      tunes.push(tune);
    }
    if (raw.trim() === "") {
      // A tune ends at an empty line.
      if (keyed) tune = null;
      continue;
    }
    const line = /^%%/.test(raw) ? raw : withoutComment(raw);
    if (line.trim() === "") continue;
    if (tune === null) {
      if (/^[LM]:/.test(line) && tunes.length === 0) common.push(line);
      continue;
    }
    if (keyed) tune.body.push(line);
    else tune.header.push(line);
    if (/^\s*K:/.test(line)) keyed = true;
  }
  return tunes.filter((each) => each.header.some((line) => /^\s*K:/.test(line)));
}

function withoutComment(line: string): string {
  for (let place = line.indexOf("%"); place >= 0; place = line.indexOf("%", place + 1))
    if (line[place - 1] !== "\\") return line.slice(0, place);
  return line;
}
