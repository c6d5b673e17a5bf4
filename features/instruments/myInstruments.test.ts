import { ownInstrument } from "@/shared/contract/instrument";
import { presets } from "@/shared/instruments/presets";
import {
  chosenInstrument,
  instrumentOf,
  makeFavourite,
  offeredInstruments,
  ownedAs,
  ownWords,
  stringWords,
  turnHand,
} from "./myInstruments";

let count = 0;
const newId = () => `7f0b6f0e-6a51-4a8e-9a53-0a3d8f6f3f${String(count++).padStart(2, "0")}`;

test.each(presets.map((preset) => preset.id))("%s becomes an own instrument that the contract accepts", (id) => {
  const own = ownedAs([], id, newId);
  expect(ownInstrument.parse(own)).toEqual(own);
  expect(instrumentOf(own)).toEqual(chosenInstrument([], id));
});

test("until told otherwise the three-string box guitar A D F♯ is played", () => {
  expect(stringWords(chosenInstrument([], null))).toBe("A D F♯");
  expect(chosenInstrument([], "gone").id).toBe("box-adf");
});

test("the favourite is played where nothing else is asked for", () => {
  const [guitar] = makeFavourite([], "guitar", newId);
  const owned = [guitar!];
  expect(chosenInstrument(owned, null).id).toBe("guitar");
  expect(chosenInstrument(owned, "ukulele").id).toBe("ukulele");
});

test("a new favourite takes the place of the old one", () => {
  const [guitar] = makeFavourite([], "guitar", newId);
  const saved = makeFavourite([guitar!], "ukulele", newId);
  expect(saved.map((own) => [own.presetId, own.favourite])).toEqual([
    ["guitar", false],
    ["ukulele", true],
  ]);
});

test("the favourite chosen again needs nothing kept", () => {
  const owned = makeFavourite([], "guitar", newId);
  expect(makeFavourite(owned, "guitar", newId)).toEqual([]);
});

test("an own instrument stands in its preset's place, once", () => {
  const left = turnHand([], "guitar", true, newId);
  const offered = offeredInstruments([left]);
  expect(offered).toHaveLength(presets.length);
  expect(offered.find(({ instrument }) => instrument.id === "guitar")?.instrument.leftHanded).toBe(true);
});

test("the favourite preset is mine in words, a name of one's own stands as it is", () => {
  const [box] = makeFavourite([], "box-gdg", newId);
  expect(ownWords(instrumentOf(box!), box!)).toBe("my box guitar, G-D-G");
  const named = { ...box!, name: "The cigar box" };
  expect(ownWords(instrumentOf(named), named)).toBe("The cigar box");
  expect(ownWords(chosenInstrument([], "guitar"), null)).toBe("Guitar");
});

test("an instrument of no preset is offered last", () => {
  const own = { ...ownedAs([], "ukulele", newId), presetId: null, name: "Tin ukulele" };
  const offered = offeredInstruments([own]);
  expect(offered.at(-1)?.instrument).toMatchObject({ id: own.id, name: "Tin ukulele" });
});
