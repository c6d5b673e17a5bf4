import { strToU8, Zip, ZipDeflate, ZipPassThrough } from "fflate";

/**
 * What one domain keeps of a person. Every domain that keeps something registers a part in `createPersonalData`: then
 * it is in the export, and gone when the account is.
 */
export interface PersonalDataPart {
  /** its folder in the archive */
  name: string;
  /** the person's files: bytes or text as they are, anything else as JSON */
  files: (userId: string) => Promise<Record<string, unknown>>;
  /** Further files too large to be held all at once: each is asked for when the one before has been taken. */
  large?(userId: string): AsyncIterable<readonly [file: string, content: Uint8Array | string]>;
  /** Erases what lies outside the database; rows go with the account. May run more than once. */
  erase?: (userId: string) => Promise<void>;
}

const readMe = `This is everything that Larkspan keeps of your account, one folder for each kind.

.json files hold all fields; charts of songs lie beside them as plain text.
Passwords, codes and keys of sessions are kept only as hashes and are not in here.
`;

/**
 * All parts in one zip archive.
 *
 * @param parts what the domains keep
 * @param userId whose data
 * @returns the archive, piece by piece. What can go wrong with the rows has gone wrong before the first piece
 */
export async function exportArchive(
  parts: readonly PersonalDataPart[],
  userId: string,
): Promise<AsyncGenerator<Uint8Array, void>> {
  const files: [string, Uint8Array][] = [["read-me.txt", strToU8(readMe)]];
  for (const { name, files: filesOf } of parts) {
    for (const [file, content] of Object.entries(await filesOf(userId)))
      files.push([`${name}/${file}`, bytesOf(content)]);
  }
  return archived(files, parts, userId);
}

async function* archived(
  files: readonly [string, Uint8Array][],
  parts: readonly PersonalDataPart[],
  userId: string,
): AsyncGenerator<Uint8Array, void> {
  const pieces: Uint8Array[] = [];
  const zip = new Zip((error, piece) => {
    if (error) throw error;
    pieces.push(piece);
  });
  const taken = () => pieces.splice(0);
  for (const [path, bytes] of files) {
    const entry = new ZipDeflate(path, { level: 6 });
    zip.add(entry);
    entry.push(bytes, true);
    yield* taken();
  }
  for (const part of parts) {
    for await (const [file, content] of part.large?.(userId) ?? []) {
      // Sound gets no smaller by packing.
      const entry = new ZipPassThrough(`${part.name}/${file}`);
      zip.add(entry);
      entry.push(bytesOf(content), true);
      yield* taken();
    }
  }
  zip.end();
  yield* taken();
}

function bytesOf(content: unknown): Uint8Array {
  if (content instanceof Uint8Array) return content;
  return strToU8(typeof content === "string" ? content : `${JSON.stringify(content, null, 2)}\n`);
}

/** A title as the name of a file. */
export function fileName(title: string, id: string): string {
  const words = title
    .normalize("NFKC")
    .replace(/[^\p{L}\p{N}-]+/gu, " ")
    .trim()
    .slice(0, 60);
  return `${words || "Untitled"} ${id.slice(0, 8)}`;
}
