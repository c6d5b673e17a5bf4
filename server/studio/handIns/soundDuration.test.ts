import { execFileSync } from "node:child_process";
import { soundDuration } from "./soundDuration";

/** Three seconds of a tone, as Debian's ffmpeg encodes it into a pipe or, where the format wants to go back, a file. */
const encoded = (...how: string[]): Buffer =>
  execFileSync("ffmpeg", ["-v", "error", "-f", "lavfi", "-i", "sine=frequency=220:duration=3", ...how, "-"]);

it.each([
  ["audio/wav", ["-ar", "24000", "-f", "wav"]],
  ["audio/mpeg", ["-f", "mp3"]],
  ["audio/ogg", ["-c:a", "libopus", "-f", "ogg"]],
  ["audio/mp4", ["-movflags", "frag_keyframe+empty_moov+default_base_moof", "-f", "mp4"]],
])("reads from the bytes of %s how long it lasts", async (type, how) => {
  const duration = await soundDuration(encoded(...how), type);
  expect(Math.abs((duration ?? 0) - 3)).toBeLessThan(0.1);
});

it("does not know it of WebM and FLAC that were written while they were recorded, nor of what cannot be read", async () => {
  expect(await soundDuration(encoded("-c:a", "libopus", "-f", "webm"), "audio/webm")).toBeNull();
  expect(await soundDuration(encoded("-f", "flac"), "audio/flac")).toBeNull();
  expect(await soundDuration(Buffer.from("RIFF and then nothing more"), "audio/wav")).toBeNull();
});
