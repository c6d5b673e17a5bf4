import { render, screen } from "@testing-library/react";
import { midiToHz } from "@/shared/music/pitch";
import type { LiveFrame } from "@/shared/voice/liveTracker";
import { LevelMeter, levelWord, litCells } from "./LevelMeter";
import { PitchTrail } from "./PitchTrail";
import { createTrailRun } from "./trailRun";
import { glides, lean, offsetWords, strength, trailNotes, trailPoints, trailScale } from "./trailGeometry";

/** Sings a note from `from` to `to` seconds, one frame in 10 ms, with a vibrato of so many cents to each side at 6 Hz. */
function sing(from: number, to: number, midi: number, vibratoCents = 0): LiveFrame[] {
  const count = Math.round((to - from) * 100);
  return Array.from({ length: count }, (_, index) => {
    const t = from + index / 100;
    return { t, hz: midiToHz(midi + (vibratoCents / 100) * Math.sin(2 * Math.PI * 6 * t)), clarity: 0.9, levelDb: -20 };
  });
}
const rest = (from: number, to: number): LiveFrame[] => sing(from, to, 60).map((frame) => ({ ...frame, hz: null }));

describe("trailNotes", () => {
  it("finds each held note and how far it is off its line", () => {
    const notes = trailNotes(trailPoints([...sing(0, 1, 64), ...rest(1, 1.3), ...sing(1.3, 2, 67.2)], 2));
    expect(notes.map((note) => note.line)).toEqual([64, 67]);
    expect(notes[0]?.cents).toBeCloseTo(0, 3);
    expect(notes[1]?.cents).toBeCloseTo(20, 3);
  });

  it("keeps a vibrato of 50 cents to each side one note", () => {
    const notes = trailNotes(trailPoints(sing(0, 2, 62, 50), 2));
    expect(notes).toHaveLength(1);
    expect(notes[0]?.line).toBe(62);
  });

  it("passes over a stray frame an octave off", () => {
    const frames = sing(0, 1, 60);
    frames[40] = { t: 0.4, hz: midiToHz(72), clarity: 0.9, levelDb: -20 };
    expect(trailNotes(trailPoints(frames, 1))).toHaveLength(1);
  });

  it("leaves out what is older than six seconds, and what has not come yet", () => {
    const points = trailPoints(sing(0, 10, 60), 8);
    expect(Math.min(...points.map((point) => point.t))).toBeGreaterThan(2);
    expect(Math.max(...points.map((point) => point.t))).toBeLessThanOrEqual(8);
  });

  it("glides between notes that follow at once, not over a breath", () => {
    const notes = trailNotes(trailPoints([...sing(0, 1, 60), ...sing(1, 2, 64), ...rest(2, 3), ...sing(3, 4, 67)], 4));
    expect(glides(notes).map(({ from, to }) => [from.line, to.line])).toEqual([[60, 64]]);
  });
});

describe("a bar of the trail", () => {
  it.each([
    [0, 0],
    [10, -4],
    [-10, 4],
    [50, -14],
    [-50, 14],
  ])("%i cents lean %f degrees", (cents, degrees) => {
    expect(lean(cents)).toBeCloseTo(degrees, 9);
  });

  it("fades from 100 to 76 per cent", () => {
    expect(strength(6, 6)).toBe(100);
    expect(strength(0, 6)).toBe(76);
  });

  it.each([
    [3, "on the line"],
    [-12.4, "12 cents flat"],
    [30, "30 cents sharp"],
  ])("says %f cents as %s", (cents, words) => {
    expect(offsetWords(cents)).toBe(words);
  });
});

describe("the trail's lines", () => {
  it("stay while the singing stays inside, and follow when it leaves", () => {
    const here = { low: 57, high: 72 };
    expect(trailScale([{ t: 0, midi: 64 }], here)).toBe(here);
    const moved = trailScale([{ t: 0, midi: 50 }], here);
    expect(moved.low).toBeLessThan(50);
    expect(moved.high).toBeGreaterThan(50);
  });

  it("hold what was sung, however wide", () => {
    const scale = trailScale(
      [
        { t: 0, midi: 40 },
        { t: 1, midi: 80 },
      ],
      null,
    );
    expect(scale.low).toBeLessThan(40);
    expect(scale.high).toBeGreaterThan(80);
  });
});

describe("the trail while it grows", () => {
  const song = [...sing(0, 1, 60), ...sing(1, 2, 64), ...rest(2, 2.4), ...sing(2.4, 3, 67)];

  it("finds, block by block, the notes of the whole", () => {
    const run = createTrailRun();
    let trail = run({ frames: [], ahead: [], now: 0 });
    for (let k = 4; k <= song.length; k += 4) {
      trail = run({ frames: song.slice(0, k), ahead: song.slice(k, k + 12), now: k / 100 });
    }
    const whole = trailNotes(trailPoints(song, 3));
    expect(trail.notes.map(({ line }) => line)).toEqual([60, 64, 67]);
    trail.notes.forEach((note, k) => {
      expect(note.start).toBeCloseTo(whole[k]?.start ?? -1, 1);
      expect(note.end).toBeCloseTo(whole[k]?.end ?? -1, 1);
    });
  });

  it("never makes a note again that is over", () => {
    const run = createTrailRun();
    const [first] = run({ frames: song.slice(0, 200), ahead: [], now: 2 }).notes;
    expect(run({ frames: song, ahead: [], now: 3 }).notes[0]).toBe(first);
  });

  it("shows a pitch as soon as it was measured, before it is decided", () => {
    const run = createTrailRun();
    run({ frames: song.slice(0, 100), ahead: [], now: 1 });
    const newest = run({ frames: song.slice(0, 100), ahead: song.slice(100, 103), now: 1.03 }).newest;
    expect(newest?.midi).toBeCloseTo(64, 3);
  });

  it("lets go of what is older than six seconds, and begins again when time goes back", () => {
    const run = createTrailRun();
    run({ frames: song, ahead: [], now: 3 });
    expect(run({ frames: song, ahead: [], now: 8.5 }).notes.map(({ line }) => line)).toEqual([67]);
    expect(run({ frames: song.slice(0, 50), ahead: [], now: 0.5 }).notes.map(({ line }) => line)).toEqual([60]);
  });
});

describe("PitchTrail", () => {
  it("says what sounds now", () => {
    render(<PitchTrail read={() => ({ frames: sing(0, 2, 64), ahead: [], now: 2 })} width={390} height={492} />);
    expect(screen.getByRole("img").getAttribute("aria-label")).toContain("Now: E4, on the line.");
  });

  it("says when nothing sounds, and has no open end then", () => {
    const { container } = render(
      <PitchTrail
        read={() => ({ frames: [...sing(0, 1, 64), ...rest(1, 3)], ahead: [], now: 3 })}
        width={390}
        height={492}
      />,
    );
    expect(screen.getByRole("img").getAttribute("aria-label")).toContain("Nothing is sounding now.");
    expect(container.querySelectorAll("circle")).toHaveLength(0);
  });
});

describe("LevelMeter", () => {
  it.each([
    [-Infinity, 0, "Silent"],
    [-60, 0, "Silent"],
    [-48, 5, "Soft"],
    [-30, 12, "Good"],
    [-8, 21, "Loud"],
    [0, 24, "Too loud"],
  ] as const)("%f dBFS lights %i of 24 cells: %s", (db, cells, word) => {
    expect(litCells(db)).toBe(cells);
    expect(levelWord(db)).toBe(word);
  });

  it("says the level in a word", () => {
    render(<LevelMeter levelDb={-20} />);
    expect(screen.getByRole("img", { name: "Level: Good" })).toBeTruthy();
  });
});
