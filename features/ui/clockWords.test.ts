import { clockWords } from "./clockWords";

test("times read as on a player", () =>
  expect([0, 7.9, 67, 600].map(clockWords)).toEqual(["0:00", "0:07", "1:07", "10:00"]));
