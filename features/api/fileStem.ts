const longest = 80;
/** Names that some systems keep for devices. */
const reserved = /^(?:con|prn|aux|nul|com\d|lpt\d)$/i;

/** A title as the name of a file, without extension: what no system allows in names is left out. */
export function fileStem(title: string): string {
  const bare = title
    .normalize("NFC")
    // Signs that separate folders or mean something to a system, controls, and marks that turn the writing direction.
    .replace(/[<>:"/\\|?*\p{Cc}\u200e\u200f\u202a-\u202e\u2066-\u2069]/gu, " ")
    .replace(/\s+/g, " ")
    .trim();
  const cut = [...bare]
    .slice(0, longest)
    .join("")
    .replace(/^[.\s]+|[.\s]+$/g, "");
  if (cut === "") return "song";
  return reserved.test(cut.split(".")[0] ?? "") ? `${cut} song` : cut;
}

/** The names of many files in one folder: the second of a name gets a number. */
export function differing(stems: readonly string[]): string[] {
  const taken = new Set<string>();
  return stems.map((stem) => {
    let name = stem;
    for (let count = 2; taken.has(name.toLowerCase()); count += 1) name = `${stem} ${count}`;
    taken.add(name.toLowerCase());
    return name;
  });
}
