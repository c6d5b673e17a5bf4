import { Unzip, UnzipInflate } from "fflate";
import { child, childrenOf, parseXml } from "./xmlTree";
import { decodeText } from "./textBytes";

const mostBytes = 10_000_000;
const mostFiles = 200;
/** Small steps, so that a bomb is noticed after at most a few megabytes. */
const step = 4096;

class TooLarge extends Error {}

/**
 * Unpacks the score from a compressed MusicXML file, watching how much comes out.
 *
 * @param bytes the .mxl file, a zip archive
 * @returns the text of its score, or why there is none
 * @see MusicXML 4.0: compressed files, META-INF/container.xml
 */
export function unpackMxl(bytes: Uint8Array): { ok: true; source: string } | { ok: false; reason: string } {
  try {
    const files = unzipXml(bytes);
    const container = files.get("META-INF/container.xml");
    const root = container === undefined ? null : parseXml(container);
    const path = childrenOf(child(root ?? undefined, "rootfiles"), "rootfile")[0]?.attributes["full-path"];
    const first = [...files].find(([name]) => !name.startsWith("META-INF/"))?.[1];
    const source = (path === undefined ? undefined : files.get(path)) ?? first;
    return source === undefined
      ? { ok: false, reason: "There is no score in this compressed MusicXML file." }
      : { ok: true, source };
  } catch (error) {
    if (error instanceof TooLarge)
      return { ok: false, reason: "This compressed file unpacks to far more than a song needs." };
    return { ok: false, reason: "This compressed MusicXML file cannot be unpacked; it is damaged." };
  }
}

function unzipXml(bytes: Uint8Array): Map<string, string> {
  const files = new Map<string, string>();
  let total = 0;
  let count = 0;
  const unzip = new Unzip((file) => {
    count += 1;
    if (count > mostFiles) throw new TooLarge();
    if (!/\.(?:xml|musicxml)$/i.test(file.name)) return;
    const chunks: Uint8Array[] = [];
    file.ondata = (error, chunk, final) => {
      if (error) throw error;
      total += chunk.length;
      if (total > mostBytes) throw new TooLarge();
      chunks.push(chunk.slice());
      if (final) files.set(file.name, decodeText(joined(chunks)));
    };
    file.start();
  });
  unzip.register(UnzipInflate);
  for (let place = 0; place < bytes.length; place += step) {
    unzip.push(bytes.subarray(place, place + step), place + step >= bytes.length);
  }
  return files;
}

function joined(chunks: readonly Uint8Array[]): Uint8Array {
  const all = new Uint8Array(chunks.reduce((sum, chunk) => sum + chunk.length, 0));
  let place = 0;
  for (const chunk of chunks) {
    all.set(chunk, place);
    place += chunk.length;
  }
  return all;
}
