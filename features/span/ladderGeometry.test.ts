import type { KeyMark, SingingVoice } from "@/shared/keys/keyScore";
import {
  commonScale,
  isNatural,
  ladderScale,
  ladderWords,
  lengthPerPercent,
  markLength,
  sideOf,
  spread,
  yOf,
  zoneOf,
} from "./ladderGeometry";

const voice: SingingVoice = { range: { lowMidi: 53, highMidi: 72 }, comfort: { lowMidi: 55, highMidi: 69 } };
const mark = (midi: number, share: number, home = false): KeyMark => ({ midi, share, zone: zoneOf(midi, voice), home });

describe("zoneOf", () => {
  it.each([
    [55, "comfort"],
    [69, "comfort"],
    [70, "reach"],
    [72, "reach"],
    [73, "beyond"],
    [54, "reach"],
    [53, "reach"],
    [52, "beyond"],
  ] as const)("puts %i into %s", (midi, zone) => {
    expect(zoneOf(midi, voice)).toBe(zone);
  });

  it("compares by the nearest semitone, since bands are measured and songs are written", () => {
    const sung: SingingVoice = { range: { lowMidi: 52.7, highMidi: 72.3 }, comfort: { lowMidi: 55.2, highMidi: 68.8 } };
    expect([53, 55, 69, 72].map((midi) => zoneOf(midi, sung))).toEqual(["reach", "comfort", "comfort", "reach"]);
  });

  it("says on which side the rest lies", () => {
    expect(sideOf(80, voice)).toBe("above");
    expect(sideOf(40, voice)).toBe("below");
  });
});

describe("the ladder's scale", () => {
  it("holds voice and song with a rung of air and ends on naturals", () => {
    const scale = ladderScale(voice, [], 1);
    expect(scale).toEqual({ low: 52, high: 74 });
    expect(isNatural(scale.low) && isNatural(scale.high)).toBe(true);
  });

  it("grows with the song", () => {
    expect(ladderScale(voice, [{ midi: 79 }, { midi: 45 }], 0)).toEqual({ low: 45, high: 79 });
  });

  it("puts a higher pitch higher, one step for each semitone", () => {
    const scale = { low: 52, high: 74 };
    expect(yOf(74, scale, 18, 9)).toBe(9);
    expect(yOf(60, scale, 18, 9) - yOf(61, scale, 18, 9)).toBe(18);
  });

  it("is one for all rows of a table", () => {
    expect(commonScale(voice, [[mark(50, 1)], [mark(75, 1)]])).toEqual({ low: 47, high: 78 });
  });
});

describe("marks", () => {
  it("are as long as their share and never shorter than high", () => {
    expect(markLength(0.1, 5.2, 8)).toBeCloseTo(52, 6);
    expect(markLength(0.001, 5.2, 8)).toBe(8);
  });

  it("shrink together where the longest would not fit", () => {
    expect(lengthPerPercent([mark(60, 0.5)], 100, 5.2)).toBe(2);
    expect(lengthPerPercent([mark(60, 0.1)], 100, 5.2)).toBe(5.2);
  });
});

describe("ladderWords", () => {
  it("tells voice, song and what lies beyond", () => {
    expect(ladderWords(voice, [mark(60, 0.6, true), mark(70, 0.3), mark(74, 0.1)], "flats")).toBe(
      "Voice from F3 to C5. Comfortable from G3 to A4. Notes from C4 to D5. 60 % of the time in comfort, 30 % in reach, 10 % beyond. Beyond: D5 above your range.",
    );
  });

  it("tells what was heard apart from what is probable", () => {
    expect(ladderWords({ ...voice, heard: { lowMidi: 55, highMidi: 70 } }, [])).toBe(
      "Sung so far from G3 to B♭4, probably reaching from F3 to C5 (estimate). Comfortable from G3 to A4.",
    );
  });

  it("has nothing to say of nothing", () => {
    expect(ladderWords(null, [])).toBe("");
  });
});

describe("spread", () => {
  it("moves close labels apart and leaves others alone", () => {
    expect(spread([10, 100], 22)).toEqual([10, 100]);
    const [first = 0, second = 0] = spread([50, 60], 22);
    expect(second - first).toBe(22);
    expect((first + second) / 2).toBe(55);
  });

  it("keeps order and distance for many", () => {
    const places = spread([10, 12, 14, 16], 20);
    places.slice(1).forEach((place, index) => expect(place - (places[index] ?? 0)).toBeGreaterThanOrEqual(20 - 1e-9));
  });
});
