import { strToU8, zip } from "fflate";

/**
 * What one domain keeps of a person. Every domain that keeps something registers a part in `createPersonalData`: then
 * it is in the export, and gone when the account is.
 */
export interface PersonalDataPart {
  /** its folder in the archive */
  name: string;
  /** the person's files: bytes or text as they are, anything else as JSON */
  files: (userId: string) => Promise<Record<string, unknown>>;
  /** Erases what lies outside the database; rows go with the account. May run more than once. */
  erase?: (userId: string) => Promise<void>;
}

const readMe = `This is everything that Larkspan keeps of your account, one folder for each kind.

.json files hold all fields; charts of songs lie beside them as plain text.
Passwords, codes and keys of sessions are kept only as hashes and are not in here.
`;

/** All parts in one zip archive. */
export async function exportArchive(parts: readonly PersonalDataPart[], userId: string): Promise<Uint8Array> {
  const files: Record<string, Uint8Array> = { "read-me.txt": strToU8(readMe) };
  for (const { name, files: filesOf } of parts) {
    for (const [file, content] of Object.entries(await filesOf(userId))) files[`${name}/${file}`] = bytesOf(content);
  }
  return new Promise((resolve, reject) => {
    zip(files, { level: 6 }, (error, archive) => (error ? reject(error) : resolve(archive)));
  });
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
