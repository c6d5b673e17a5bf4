import { soundEnding, soundType } from "./soundType";

const bytes = (...parts: (string | number[])[]) =>
  Buffer.concat([...parts.map((part) => Buffer.from(part as string, "latin1")), Buffer.alloc(200)]);

/** The head of a WebM file with one track of this codec (RFC 8794; Matroska codec mappings, RFC 9559). */
const webm = (codec: string) =>
  bytes(
    [0x1a, 0x45, 0xdf, 0xa3, 0x87, 0x42, 0x82, 0x84],
    "webm",
    [0x18, 0x53, 0x80, 0x67, 0x40, 0x20],
    [0x86, 0x86],
    codec,
  );
/** The head of an MP4 file (ISO/IEC 14496-12): its brand, and the handler of one track. */
const mp4 = (brand: string, handler: string) =>
  bytes(
    [0, 0, 0, 0x14],
    "ftyp",
    brand,
    [0, 0, 0, 0],
    brand,
    [0, 0, 0, 0x20],
    "hdlr",
    [0, 0, 0, 0, 0, 0, 0, 0],
    handler,
  );

it.each([
  ["what Chromium and Firefox record", webm("A_OPUS"), "audio/webm", "webm"],
  ["what Safari records", mp4("isom", "soun"), "audio/mp4", "m4a"],
  ["an m4a file", mp4("M4A ", "soun"), "audio/mp4", "m4a"],
  ["Opus in Ogg", bytes("OggS", Array<number>(24).fill(0), "OpusHead"), "audio/ogg", "ogg"],
  ["a wav file", bytes("RIFF", [0xff, 0, 0, 0], "WAVEfmt "), "audio/wav", "wav"],
  ["an mp3 file", bytes([0xff, 0xfb, 0x90, 0x44]), "audio/mpeg", "mp3"],
  ["a flac file", bytes("fLaC"), "audio/flac", "flac"],
])("takes %s as sound", async (_what, file, type, ending) => {
  expect(await soundType(file)).toBe(type);
  expect(soundEnding(type)).toBe(ending);
});

it.each([
  ["a film in WebM", webm("V_VP9")],
  ["a film in MP4", mp4("isom", "vide")],
  ["a page", bytes("<!doctype html><script>")],
  ["a picture", bytes([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0, 0, 0, 0x0d], "IHDR")],
  ["a program", bytes("MZ")],
  ["nothing", Buffer.alloc(0)],
])("refuses %s", async (_what, file) => {
  expect(await soundType(file)).toBeNull();
});
