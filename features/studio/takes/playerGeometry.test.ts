import { pitchRoom, pitchSpan, trailPath, wavePath, xOf, yOf } from "./playerGeometry";

const place = { width: 300, height: 112, durationS: 30, low: 50, high: 62 };

it("stands times from edge to edge and pitches from top to foot, and nothing outside", () => {
  expect([xOf(place, 0), xOf(place, 15), xOf(place, 30), xOf(place, 40)]).toEqual([0, 150, 300, 300]);
  expect([yOf(place, 62), yOf(place, 50)]).toEqual([6, 106]);
});

it("shows an octave at least, and room round what lies wider", () => {
  expect(pitchSpan({ waveform: [], trail: [{ t: 0, midi: 60 }], tune: [] })).toEqual({ low: 54, high: 66 });
  expect(pitchSpan({ waveform: [], trail: [{ t: 0, midi: 48.5 }], tune: [{ t: 0, durationS: 1, midi: 70 }] })).toEqual({
    low: 47,
    high: 71,
  });
  expect(pitchSpan({ waveform: [], trail: [], tune: [] })).toEqual({ low: 54, high: 66 });
});

it("breaks the line where nothing was sung, also in a long take whose points lie further apart", () => {
  const sung = (step: number) => [0, 1, 2, 3, 40, 41].map((k) => ({ t: k * step, midi: 55 }));
  for (const step of [0.01, 0.06]) expect(trailPath(place, sung(step)).match(/M/g)).toHaveLength(2);
});

it("draws silence as a thin line and the loudest to both edges", () => {
  expect(wavePath([0, 0.4], 100, 40)).toBe("M0.0 19.3L100.0 0.0L100.0 40.0L0.0 20.8Z");
  expect(wavePath([], 100, 40)).toBe("");
});

it("keeps room for a pitch where there is one, and none for a spoken answer", () => {
  const sung = { waveform: [0.2, 0.4], trail: [{ t: 0, midi: 60 }], tune: [] };
  expect(pitchRoom(sung)).toBeGreaterThan(100);
  expect(pitchRoom({ ...sung, trail: [] })).toBe(0);
});
