import { fileTypeFromBuffer } from "file-type/core";

/** So many bytes from the beginning tell what a file is. */
export const tellingBytes = 1 << 20;

/** What file-type calls the sound that browsers record and people upload, and as what it is played. */
const played: Readonly<Record<string, string>> = {
  "video/webm": "audio/webm",
  "audio/webm": "audio/webm",
  "video/mp4": "audio/mp4",
  "audio/mp4": "audio/mp4",
  "audio/x-m4a": "audio/mp4",
  "audio/ogg": "audio/ogg",
  "audio/ogg; codecs=opus": "audio/ogg",
  "audio/wav": "audio/wav",
  "audio/vnd.wave": "audio/wav",
  "audio/mpeg": "audio/mpeg",
  "audio/flac": "audio/flac",
  "audio/x-flac": "audio/flac",
};

/** Marks of moving pictures in the containers that can hold both: codecs of WebM, and the handler of MP4. */
const pictures = /V_VP8|V_VP9|V_AV1|V_MPEG|hdlr.{8}vide/s;

/** As what a recording is played, from its bytes and not from what was said of it; null for anything but sound. */
export async function soundType(beginning: Uint8Array): Promise<string | null> {
  const found = await fileTypeFromBuffer(beginning);
  const type = found && played[found.mime];
  if (!type) return null;
  return pictures.test(Buffer.from(beginning).toString("latin1")) ? null : type;
}

const endings: Readonly<Record<string, string>> = {
  "audio/webm": "webm",
  "audio/mp4": "m4a",
  "audio/ogg": "ogg",
  "audio/wav": "wav",
  "audio/mpeg": "mp3",
  "audio/flac": "flac",
};

/** How the name of such a file ends. */
export const soundEnding = (type: string | null): string => endings[type ?? ""] ?? "bin";
