import { presetGroups } from "@/shared/instruments/presets";
import { plainAccidentals } from "@/shared/music/pitch";
import { stringWords, type OfferedInstrument } from "../myInstruments";

/** Instruments under one heading. */
export interface InstrumentGroup {
  name: string;
  instruments: OfferedInstrument[];
}

/** Letters and digits only, accidentals as # and b: "D-G-B", "dgb" and "D G B" are the same. */
const plain = (text: string) =>
  plainAccidentals(text)
    .toLowerCase()
    .replaceAll(/[^a-z0-9#]+/g, " ");

const note = /^[a-g][#b]?$/;

/**
 * Whether what was typed fits the name, the tuning or the kind of an instrument. Notes alone are looked for in their
 * order; among other words, one or two letters are a word of their own: the G of "open G" is not that of "guitar".
 */
function fits({ instrument }: OfferedInstrument, kind: string, typed: string): boolean {
  const words = plain(typed).split(" ").filter(Boolean);
  const notes = plain(stringWords(instrument));
  if (words.length > 1 && words.every((word) => note.test(word))) return ` ${notes} `.includes(` ${words.join(" ")} `);
  const text = ` ${plain(instrument.name)} ${plain(kind)} ${notes} ${notes.replaceAll(" ", "")} ${instrument.strings.length} strings `;
  return words.every((word) => text.includes(word.length < 3 ? ` ${word} ` : word));
}

/** One's own first, then the presets by kind; only those that fit what was typed, and no empty groups. */
export function searchInstruments(
  mine: readonly OfferedInstrument[],
  others: readonly OfferedInstrument[],
  typed: string,
): InstrumentGroup[] {
  const groups = [
    { name: "Yours", instruments: mine.filter((each) => fits(each, "yours", typed)) },
    ...presetGroups.map(({ name, presets }) => ({
      name,
      instruments: presets.flatMap(({ id }) =>
        others.filter((each) => each.instrument.id === id && fits(each, name, typed)),
      ),
    })),
  ];
  return groups.filter(({ instruments }) => instruments.length > 0);
}
