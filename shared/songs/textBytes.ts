import { strFromU8 } from "fflate";

/**
 * Turns a text file's bytes into text: UTF-8, or UTF-16 where a byte order mark says so.
 *
 * @param bytes the file
 * @returns the text without byte order mark
 * @see Unicode Standard, chapter 23: byte order mark
 * @example decodeText(Uint8Array.of(0xef, 0xbb, 0xbf, 65)) // => "A"
 */
export function decodeText(bytes: Uint8Array): string {
  const little = bytes[0] === 0xff && bytes[1] === 0xfe;
  if (!little && !(bytes[0] === 0xfe && bytes[1] === 0xff)) return strFromU8(bytes).replace(/^\uFEFF/, "");
  const units: string[] = [];
  for (let place = 2; place + 1 < bytes.length; place += 2) {
    const [low, high] = little ? [bytes[place]!, bytes[place + 1]!] : [bytes[place + 1]!, bytes[place]!];
    units.push(String.fromCharCode(high * 256 + low));
  }
  return units.join("");
}
