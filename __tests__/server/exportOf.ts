import { strFromU8, unzipSync } from "fflate";
import type { Person } from "./testServer";

/** What somebody gets who takes everything along: the files of the archive, by name. */
export async function exportOf(person: Person): Promise<Record<string, Uint8Array>> {
  const { body } = await person
    .get("/api/account/export")
    .buffer(true)
    .parse((res, done) => {
      const chunks: Buffer[] = [];
      res.on("data", (chunk: Buffer) => chunks.push(chunk));
      res.on("end", () => done(null, Buffer.concat(chunks)));
    })
    .expect(200)
    .expect("Content-Type", "application/zip");
  return unzipSync(new Uint8Array(body as Buffer));
}

/** The same as texts. */
export async function exportedTexts(person: Person): Promise<Record<string, string>> {
  const files = Object.entries(await exportOf(person));
  return Object.fromEntries(files.map(([name, bytes]) => [name, strFromU8(bytes)]));
}
