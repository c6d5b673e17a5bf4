import { emptyDraft } from "../editor/songDraft";
import { takenFromFile } from "./takenFromFile";

const file = {
  ok: true as const,
  voices: [],
  proposed: 0,
  title: "Low Tide",
  tempo: 89.6,
  beatsPerBar: 3,
  cautions: [],
};

test("a file fills what nobody typed", () => {
  expect(takenFromFile(emptyDraft, file)).toEqual({
    change: { title: "Low Tide", tempo: "90", beatsPerBar: "3" },
    words: "Also taken from the file: the title, 90 quarter notes a minute, 3 beats in a bar.",
  });
});

test("what was typed stays", () => {
  const typed = { ...emptyDraft, title: "My own", tempo: "120", beatsPerBar: "6" };
  expect(takenFromFile(typed, file)).toEqual({ change: {}, words: null });
});
