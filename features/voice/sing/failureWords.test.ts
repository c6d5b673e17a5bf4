import { failedWords } from "../guided/guidedWords";
import { failureWords } from "./failureWords";

const brokenOff = (stoppedBy: "muted" | "hidden" | "taken" | "stalled", seconds: number) =>
  failureWords({ kind: "interrupted", report: null, seconds, stoppedBy });

it("says for each interruption what to do about that one", () => {
  expect(brokenOff("muted", 3).next).toBe("Unmute it, then sing again.");
  expect(brokenOff("hidden", 3).next).toBe("Keep this page in front, then sing again.");
  expect(brokenOff("taken", 3).next).toBe("Wait until it is free, then sing again.");
  expect(failedWords("muted").next).toBe("Unmute it, then start again.");
});

it("names the time of an interruption, unless nothing was sung before it", () => {
  expect(brokenOff("hidden", 3.4).happened).toMatch(/^This page went into the background at 3 s\./);
  expect(brokenOff("stalled", 0).happened).toBe("The microphone stopped sending sound.");
});

it.each(["too-short", "too-quiet", "too-noisy", "clipped", "not-singing", "several-voices"] as const)(
  "asks nobody to sing into a microphone when a recording was refused as %s",
  (kind) => {
    const report = { sentence: "Hardly any sound reached the microphone.", nextStep: "Move closer, and sing again." };
    const { title, happened, next } = failureWords({ kind, report, seconds: 20, stoppedBy: "file" });
    expect(next).toMatch(/^Choose /);
    expect(`${title} ${happened}`).not.toMatch(/reached|microphone|around you/);
    expect(failureWords({ kind, report, seconds: 20, stoppedBy: "singer" }).next).toBe(report.nextStep);
  },
);
