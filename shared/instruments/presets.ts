import { boxPresets } from "./presets/boxPresets";
import { banjoPresets, dulcimerPresets, mandolinPresets } from "./presets/folkPresets";
import { guitarPresets } from "./presets/guitarPresets";
import type { Instrument } from "./instrument";
import { ukulelePresets } from "./presets/ukulelePresets";

/** Presets that belong together in a list. */
export interface PresetGroup {
  name: string;
  presets: readonly Instrument[];
}

/** The presets by kind of instrument, in the order in which they are offered. */
export const presetGroups: readonly PresetGroup[] = [
  { name: "Box guitars", presets: boxPresets },
  { name: "Guitars", presets: guitarPresets },
  { name: "Ukuleles", presets: ukulelePresets },
  { name: "Banjo", presets: banjoPresets },
  { name: "Mandolin family", presets: mandolinPresets },
  { name: "Mountain dulcimers", presets: dulcimerPresets },
];

/**
 * Instruments in the tunings that the trade uses, strings from the bass side to the treble side.
 *
 * Gauges are given where a maker's chart or page prints them, or where common practice picks them for about even
 * tension; elsewhere they are null and only semitone rules hold.
 *
 * @see D'Addario, string tension chart 13934 (scales, sets); makers' pages (box guitars, ukuleles); common practice (tunings)
 */
export const presets: readonly Instrument[] = presetGroups.flatMap((group) => group.presets);

/**
 * Finds a preset.
 *
 * @param id such as "box-adf"
 * @returns the instrument, or null if there is none of that id
 * @example findPreset("lute") // => null
 */
export function findPreset(id: string): Instrument | null {
  return presets.find((instrument) => instrument.id === id) ?? null;
}
