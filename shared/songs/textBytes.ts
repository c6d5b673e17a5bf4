import { strFromU8 } from "fflate";

/** What Windows-1252 has at 0x80 to 0x9f, where Latin-1 has control characters. */
const windows = "€\u0081‚ƒ„…†‡ˆ‰Š‹Œ\u008dŽ\u008f\u0090‘’“”•–—˜™š›œ\u009džŸ";

/**
 * Turns a text file's bytes into text: UTF-16 where a byte order mark says so, UTF-8 where the bytes are that, else the
 * western code page that old programs wrote.
 *
 * @param bytes the file
 * @returns the text without byte order mark
 * @see Unicode Standard, chapter 23: byte order mark; chapter 3, table 3-7: well-formed UTF-8; WHATWG Encoding, windows-1252
 * @example decodeText(Uint8Array.of(0xef, 0xbb, 0xbf, 65)) // => "A"
 * @example decodeText(Uint8Array.of(0x63, 0x9c, 0x75, 0x72)) // => "cœur"
 */
export function decodeText(bytes: Uint8Array): string {
  const little = bytes[0] === 0xff && bytes[1] === 0xfe;
  if (!little && !(bytes[0] === 0xfe && bytes[1] === 0xff)) {
    if (isUtf8(bytes)) return strFromU8(bytes).replace(/^\uFEFF/, "");
    return strFromU8(bytes, true).replace(/[\u0080-\u009f]/g, (sign) => windows[sign.charCodeAt(0) - 0x80]!);
  }
  const units: string[] = [];
  for (let place = 2; place + 1 < bytes.length; place += 2) {
    const [low, high] = little ? [bytes[place]!, bytes[place + 1]!] : [bytes[place + 1]!, bytes[place]!];
    units.push(String.fromCharCode(high * 256 + low));
  }
  return units.join("");
}

function isUtf8(bytes: Uint8Array): boolean {
  let place = 0;
  while (place < bytes.length) {
    const first = bytes[place]!;
    const more =
      first < 0x80
        ? 0
        : first >= 0xc2 && first < 0xe0
          ? 1
          : first >= 0xe0 && first < 0xf0
            ? 2
            : first >= 0xf0 && first < 0xf5
              ? 3
              : -1;
    if (more < 0) return false;
    for (let next = 1; next <= more; next += 1) if (((bytes[place + next] ?? 0) & 0xc0) !== 0x80) return false;
    place += more + 1;
  }
  return true;
}
