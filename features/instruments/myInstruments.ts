import type { OwnInstrument } from "@/shared/contract/instrument";
import type { Instrument } from "@/shared/instruments/instrument";
import { presets } from "@/shared/instruments/presets";
import { glyphs } from "@/shared/music/pitch";

/** What is played until somebody says what they play. */
const firstOffered = "box-adf";

/** An instrument to choose: a preset, or one's own. */
export interface OfferedInstrument {
  instrument: Instrument;
  own: OwnInstrument | null;
}

/** An own instrument as the engine wants it; the id of the preset stands for the one taken from it. */
export function instrumentOf(own: OwnInstrument, id = own.presetId ?? own.id): Instrument {
  const { presetId: _preset, favourite: _favourite, photo: _photo, fretMap, ...rest } = own;
  return { ...rest, id, ...(fretMap === undefined ? null : { fretMap }) };
}

/** The own instrument that stands in a preset's place: the favourite of several. */
function inPlaceOf(owned: readonly OwnInstrument[], presetId: string): OwnInstrument | null {
  const taken = owned.filter((each) => each.presetId === presetId);
  return taken.find(({ favourite }) => favourite) ?? taken[0] ?? null;
}

/** All presets, each in the state that its owner gave it, and behind them every other instrument of one's own. */
export function offeredInstruments(owned: readonly OwnInstrument[]): OfferedInstrument[] {
  const fromPresets = presets.map((preset) => {
    const own = inPlaceOf(owned, preset.id);
    return { instrument: own ? instrumentOf(own) : preset, own };
  });
  const others = owned.filter((own) => !fromPresets.some((each) => each.own === own));
  return [...fromPresets, ...others.map((own) => ({ instrument: instrumentOf(own, own.id), own }))];
}

/** What is one's own, the favourite first; a preset only turned or marked counts too. */
export function ownFirst(owned: readonly OwnInstrument[]): { mine: OfferedInstrument[]; others: OfferedInstrument[] } {
  const offered = offeredInstruments(owned);
  const favourite = ({ own }: OfferedInstrument) => (own?.favourite ? 0 : 1);
  const mine = offered.filter(({ own }) => own !== null).sort((a, b) => favourite(a) - favourite(b));
  return { mine, others: offered.filter(({ own }) => own === null) };
}

/** The instrument of an id; the favourite, or else the first offered, where the id is unknown or null. */
export function chosenInstrument(owned: readonly OwnInstrument[], id: string | null): Instrument {
  const offered = offeredInstruments(owned);
  const found =
    offered.find(({ instrument }) => instrument.id === id) ??
    offered.find(({ own }) => own?.favourite === true) ??
    offered.find(({ instrument }) => instrument.id === firstOffered) ??
    offered[0];
  if (!found) throw new RangeError("there are no instruments");
  return found.instrument;
}

/** What has to be kept so that one instrument is the favourite and no other is. */
export function makeFavourite(owned: readonly OwnInstrument[], id: string, newId: () => string): OwnInstrument[] {
  const own = ownedAs(owned, id, newId);
  const before = owned
    .filter((each) => each.favourite && each.id !== own.id)
    .map((each) => ({ ...each, favourite: false }));
  return own.favourite && owned.includes(own) ? before : [...before, { ...own, favourite: true }];
}

/** The same instrument for the other hand. */
export function turnHand(
  owned: readonly OwnInstrument[],
  id: string,
  leftHanded: boolean,
  newId: () => string,
): OwnInstrument {
  return { ...ownedAs(owned, id, newId), leftHanded };
}

/** One's own of that id; a copy of the preset where there is none yet. */
export function ownedAs(owned: readonly OwnInstrument[], id: string, newId: () => string): OwnInstrument {
  const own = offeredInstruments(owned).find(({ instrument }) => instrument.id === id)?.own;
  if (own) return own;
  const { fretMap, ...preset } = chosenInstrument(owned, id);
  return {
    ...preset,
    id: newId(),
    presetId: preset.id,
    favourite: false,
    ...(fretMap === undefined ? null : { fretMap }),
  };
}

/** An instrument in a list to choose from: the favourite preset is "my guitar", a name of one's own stands as it is. */
export function ownWords(instrument: Instrument, own: OwnInstrument | null): string {
  const { name } = instrument;
  const isPreset = presets.some((preset) => preset.id === own?.presetId && preset.name === name);
  return own?.favourite && isPreset ? `my ${name.charAt(0).toLowerCase()}${name.slice(1)}` : name;
}

/** Name and tuning: names that hold the tuning say it once. */
export function instrumentWords(instrument: Instrument): string {
  return instrument.name.includes(",") ? instrument.name : `${instrument.name}, ${stringWords(instrument)}`;
}

/** The strings by name, "A D F♯"; with octaves where asked. */
export function stringWords(instrument: Instrument, octaves = false): string {
  return instrument.strings.map(({ note }) => glyphs(octaves ? note : note.replace(/-?\d+$/, ""))).join(" ");
}
