import { soundKind } from "./soundFile";

const bytes = (...parts: (string | number[])[]) =>
  Uint8Array.from(parts.flatMap((part) => (typeof part === "string" ? [...part].map((c) => c.charCodeAt(0)) : part)));

it.each([
  ["wav", bytes("RIFF", [0, 0, 0, 0], "WAVEfmt ")],
  ["flac", bytes("fLaC")],
  ["ogg", bytes("OggS")],
  ["m4a", bytes([0, 0, 0, 28], "ftypM4A ")],
  ["webm", bytes([0x1a, 0x45, 0xdf, 0xa3])],
  ["mp3", bytes("ID3")],
  ["mp3", bytes([0xff, 0xfb, 0x90, 0x64])],
])("knows %s by its first bytes", (kind, head) => {
  expect(soundKind(head)).toBe(kind);
});

it.each([
  ["text", bytes("This is a text, whatever its name is.")],
  ["another RIFF", bytes("RIFF", [0, 0, 0, 0], "AVI LIST")],
  ["a picture", bytes([0x89], "PNG", [13, 10, 26, 10])],
  ["ADTS, which has no layer", bytes([0xff, 0xf1, 0x50, 0x80])],
  ["two set bytes", bytes([0xff, 0xff, 0xff, 0xff])],
  ["nothing", bytes()],
])("refuses %s", (_what, head) => {
  expect(soundKind(head)).toBeNull();
});
