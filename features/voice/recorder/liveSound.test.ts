import { midiToHz } from "@/shared/music/pitch";
import { createLiveSound, hear, silence } from "./liveSound";

const frames = (midi: number | null, count: number) =>
  Array.from({ length: count }, (_, k) => ({
    ...{ t: k / 100, clarity: 1, levelDb: -20 },
    hz: midi === null ? null : midiToHz(midi + 0.3 * Math.sin(k / 3)),
  }));

it("counts how long each note was held, vibrato included, and leaves out what only passed by", () => {
  const live = createLiveSound();
  const tell = (midi: number | null, count: number) =>
    hear(
      live,
      { frames: frames(midi, count), ahead: [], seconds: live.seconds + count / 100, levelDb: -20, peak: 0.1 },
      0,
    );
  tell(60, 100);
  tell(62, 10);
  tell(64, 50);
  tell(null, 30);
  tell(60, 40);
  expect([...live.held].map(([midi, seconds]) => [midi, Math.round(10 * seconds) / 10])).toEqual([
    [60, 1.4],
    [64, 0.5],
  ]);
  silence(live);
  expect(live.held.size).toBe(0);
});
