import { fretSemitones } from "@/shared/instruments/frets";
import type { Instrument } from "@/shared/instruments/instrument";
import { type KeyName, tonicPitchClass } from "@/shared/music/keyName";
import type { Way } from "@/shared/ways/way";

/** What the address of the walk may say of a way. */
export interface AskedWay {
  retune?: string;
  capo?: string;
  shapes?: string;
}

type Moves = Pick<Way, "retune" | "capo" | "shapeKey">;

/** The way that an address asks for; null where it asks for none, or for one that does not lead into the key. */
export function askedWay(asked: AskedWay, key: KeyName, instrument: Instrument): Moves | null {
  const { retune = "", capo = "", shapes = "" } = asked;
  if (!/^-?\d{1,2}$/.test(retune) || !/^\d{1,2}$/.test(capo) || !/^[A-G][#b]?$/.test(shapes)) return null;
  const way = { retune: Number(retune), capo: Number(capo), shapeKey: shapes };
  return leadsInto(way, key, instrument) ? way : null;
}

/** Whether shapes, retune and capo together sound in the key. */
function leadsInto(way: Moves, key: KeyName, instrument: Instrument): boolean {
  const raise = fretSemitones(instrument, way.capo);
  if (raise === null || way.capo > Math.max(instrument.capoTo, 0)) return false;
  const sum = tonicPitchClass(way.shapeKey) + way.retune + raise;
  return Math.abs(way.retune) <= 12 && (sum + 24) % 12 === tonicPitchClass(key.tonic);
}
