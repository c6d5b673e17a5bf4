import { keptSize, shrinkPhoto } from "./shrinkPhoto";

test.each([
  [4000, 3000, 640, 480],
  [600, 1200, 320, 640],
  [300, 200, 300, 200],
  [9000, 4, 640, 1],
])("a photo of %i by %i is kept at %i by %i", (width, height, keptWidth, keptHeight) => {
  expect(keptSize(width, height)).toEqual({ width: keptWidth, height: keptHeight });
});

test("what is no picture, or far too large, is told in words", async () => {
  expect(await shrinkPhoto(new Blob(["words"]))).toEqual({ problem: expect.stringMatching(/no picture/) });
  const huge = { size: 50 * 2 ** 20 } as Blob;
  expect(await shrinkPhoto(huge)).toEqual({ problem: expect.stringMatching(/larger than 40 MB/) });
});
