import { waveform } from "./waveform";

it("shows every swing in 400 steps, the loudest whole, none beyond what can be", () => {
  const pcm = new Float32Array(48_000);
  pcm[24_000] = -0.75;
  pcm[47_999] = 1.4;
  const picture = waveform(pcm);
  expect(picture).toHaveLength(400);
  expect([picture[0], picture[200], picture[399]]).toEqual([0, 0.75, 1]);
});

it("has no more steps than a very short sound has samples", () => {
  expect(waveform(new Float32Array([0.5, -0.25]))).toEqual([0.5, 0.25]);
  expect(waveform(new Float32Array(0))).toEqual([]);
});
