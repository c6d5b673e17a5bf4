import { execFileSync } from "node:child_process";
import { soundDuration } from "./soundDuration";

/** So many seconds of a tone, as Debian's ffmpeg encodes it into a pipe, where it cannot go back to write a duration. */
const encoded = (seconds: number, how: string[]): Buffer =>
  execFileSync("ffmpeg", ["-v", "error", "-f", "lavfi", "-i", `sine=frequency=220:duration=${seconds}`, ...how, "-"], {
    maxBuffer: 20 << 20,
  });
const fragments = ["-movflags", "empty_moov+default_base_moof", "-frag_duration", "1000000", "-f", "mp4"];

it.each([
  ["wav", ["-ar", "8000", "-f", "wav"]],
  ["mp3", ["-f", "mp3"]],
  ["Opus in Ogg", ["-c:a", "libopus", "-f", "ogg"]],
  ["Vorbis in Ogg", ["-c:a", "libvorbis", "-f", "ogg"]],
  ["m4a that was written while it was recorded", fragments],
  ["WebM that was written while it was recorded", ["-c:a", "libopus", "-f", "webm", "-live", "1"]],
  ["FLAC that was written while it was recorded", ["-f", "flac"]],
])("reads from the bytes of %s how long it lasts, short or long", async (_what, how) => {
  expect(Math.abs(((await soundDuration(encoded(3, how))) ?? 0) - 3)).toBeLessThan(0.1);
  expect(Math.abs(((await soundDuration(encoded(620, how))) ?? 0) - 620)).toBeLessThan(0.1);
});

it("believes the sound and not a head that says otherwise", async () => {
  const webm = encoded(3, ["-c:a", "libopus", "-f", "webm"]);
  // RFC 9559: Info (1549A966) begins with TimestampScale (2AD7B1); here a Duration (4489) of 100 ms is put before it.
  const tenth = Buffer.from([0x44, 0x89, 0x84, 0x42, 0xc8, 0, 0]);
  const info = webm.indexOf(Buffer.from([0x15, 0x49, 0xa9, 0x66]));
  const scale = webm.indexOf(Buffer.from([0x2a, 0xd7, 0xb1]), info);
  expect(info).toBeGreaterThan(0);
  const size = webm.subarray(info + 4, scale);
  const longer = Buffer.from(size);
  longer[longer.length - 1] = (longer.at(-1) ?? 0) + tenth.length;
  const said = Buffer.concat([webm.subarray(0, info + 4), longer, tenth, webm.subarray(scale)]);
  expect(Math.abs(((await soundDuration(said)) ?? 0) - 3)).toBeLessThan(0.1);
});

it.each([
  ["a head and nothing more", Buffer.from("RIFF and then nothing more")],
  ["nothing", Buffer.alloc(0)],
  ["a FLAC head over zeros", Buffer.concat([Buffer.from("fLaC"), Buffer.alloc(2000)])],
  ["WebM that was cut before its first sound", encoded(3, ["-c:a", "libopus", "-f", "webm"]).subarray(0, 200)],
])("does not know it of %s", async (_what, bytes) => {
  expect(await soundDuration(bytes)).toBeNull();
});
