import { type Decision, mostEarlier } from "./decision";
import { joined, presentChoice, withHistory } from "./decisionHistory";

const day = (n: number) => new Date(Date.UTC(2026, 2, n)).toISOString();

function aDecision(tonic: string, n: number, earlier: Decision["earlier"] = [], id = "one"): Decision {
  const choice = { tonic, shift: 0, score: 80, reason: "Sits well.", instrument: null, way: null };
  return { id, songId: "song", voiceId: null, ...choice, decidedAt: day(n), earlier };
}

const past = (tonic: string, n: number) => presentChoice(aDecision(tonic, n));
const keys = (decision: Decision) => [decision.tonic, ...decision.earlier.map(({ tonic }) => tonic)].join(" ");

test("what takes the place of a state the sender did not know keeps it in its history", () => {
  const kept = aDecision("C", 3, [past("D", 2), past("E", 1)]);
  expect(keys(withHistory(aDecision("G", 4), kept))).toBe("G C D E");
  expect(keys(withHistory(aDecision("G", 4, [past("E", 1)]), kept))).toBe("G C D E");
  expect(keys(withHistory(aDecision("G", 4, [], "two"), kept))).toBe("G C D E");
});

test("what the sender knew is left as sent, and so is going back", () => {
  const kept = aDecision("C", 3, [past("D", 2), past("E", 1)]);
  expect(withHistory(kept, kept)).toBe(kept);
  const next = aDecision("G", 4, [past("C", 3)]);
  expect(withHistory(next, kept)).toBe(next);
  const back = aDecision("D", 2, [past("E", 1)]);
  expect(withHistory(back, kept)).toBe(back);
});

test("another device's decision is no going back, though its choice stands in the history", () => {
  const kept = aDecision("C", 3, [past("D", 2)]);
  expect(keys(withHistory(aDecision("D", 2, [], "two"), kept))).toBe("D C");
});

test("the history has its bound, and the oldest fall out", () => {
  const many = Array.from({ length: mostEarlier }, (_, k) => past("E", mostEarlier - k));
  const next = withHistory(aDecision("G", 28), aDecision("C", 27, many));
  expect(next.earlier).toHaveLength(mostEarlier);
  expect(next.earlier[0]?.tonic).toBe("C");
  expect(next.earlier.at(-1)?.decidedAt).toBe(day(2));
});

test("two made apart become one: the later is present, every other choice its history, once", () => {
  const first = aDecision("C", 3, [past("E", 1)]);
  const second = aDecision("G", 4, [past("D", 2), past("E", 1)], "two");
  expect(keys(joined(first, second))).toBe("G C D E");
  expect(keys(joined(second, first))).toBe("G C D E");
  expect([joined(first, second).id, joined(second, first).id]).toEqual(["one", "two"]);
  expect(joined(first, { ...first, id: "two" })).toEqual(first);
});
