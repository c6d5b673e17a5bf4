import fc from "fast-check";
import { findPreset, presets } from "@/shared/instruments/presets";
import { fretSemitones } from "@/shared/instruments/frets";
import { spellTonic } from "@/shared/music/keyName";
import { askedWay } from "./askedWay";

const inC = { tonic: "C", mode: "major" } as const;
const box = findPreset("box-adf")!;

test("a way that leads into the key is taken from the address", () => {
  expect(askedWay({ retune: "0", capo: "3", shapes: "A" }, inC, box)).toEqual({ retune: 0, capo: 3, shapeKey: "A" });
  expect(askedWay({ retune: "-2", capo: "0", shapes: "D" }, inC, box)).toEqual({ retune: -2, capo: 0, shapeKey: "D" });
});

test.each([
  ["does not lead there", { retune: "0", capo: "2", shapes: "A" }],
  ["is not whole", { retune: "0", capo: "3" }],
  ["is no number", { retune: "x", capo: "3", shapes: "A" }],
  ["is no key", { retune: "0", capo: "3", shapes: "H" }],
  ["has a capo higher than one is of use", { retune: "0", capo: "15", shapes: "A" }],
])("an address whose way %s asks for none", (_, asked) => {
  expect(askedWay(asked, inC, box)).toBeNull();
});

test("whatever is taken from an address sounds in the key", () => {
  fc.assert(
    fc.property(
      fc.constantFrom(...presets),
      fc.integer({ min: 0, max: 11 }),
      fc.integer({ min: -4, max: 2 }),
      fc.integer({ min: 0, max: 12 }),
      fc.integer({ min: 0, max: 11 }),
      (instrument, shapes, retune, capo, to) => {
        const key = { tonic: spellTonic(to, "major"), mode: "major" } as const;
        const asked = { retune: String(retune), capo: String(capo), shapes: spellTonic(shapes, "major") };
        const heard = (shapes + retune + (fretSemitones(instrument, capo) ?? 0) + 24) % 12;
        const useful = capo <= instrument.capoTo && fretSemitones(instrument, capo) !== null;
        expect(askedWay(asked, key, instrument) !== null).toBe(useful && heard === to);
      },
    ),
  );
});
