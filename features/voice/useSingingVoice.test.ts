import type { Voice } from "@/shared/contract/voice";
import { pickVoice } from "./useSingingVoice";

const voice: Voice = { id: "v1", name: "My voice", byHand: null, createdAt: "2026-11-01T10:00:00.000Z" };

it("picks the voice asked for, else the chosen one, else the first", () => {
  const second = { ...voice, id: "v2" };
  expect(pickVoice([voice, second], "v2", "v1")).toBe(second);
  expect(pickVoice([voice, second], "gone", "v1")).toBeNull();
  expect(pickVoice([voice, second], undefined, "v2")).toBe(second);
  expect(pickVoice([voice, second], undefined, "gone")).toBe(voice);
  expect(pickVoice([], undefined, null)).toBeNull();
});
