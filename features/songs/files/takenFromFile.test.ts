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

test("the next file replaces what the file before it filled in, and nothing that was typed since", () => {
  const first = takenFromFile(emptyDraft, file).change;
  const next = { ...file, title: null, tempo: 120, beatsPerBar: 6 };
  expect(takenFromFile({ ...emptyDraft, ...first }, next, first)).toEqual({
    change: { title: "", tempo: "120", beatsPerBar: "6" },
    words: "Also taken from the file: 120 quarter notes a minute, 6 beats in a bar.",
  });
  expect(takenFromFile({ ...emptyDraft, ...first, title: "My own", tempo: "88" }, next, first).change).toEqual({
    beatsPerBar: "6",
  });
});
