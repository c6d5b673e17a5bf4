import type { Mode } from "../../music/keyName";
import { keyFit, type FixedInstrument } from "./fixedInstrument";

/**
 * Puts the keys first that the fixed instruments play.
 *
 * A key with a note outside the voice still stands under every key without. Then fewer instruments left out come first,
 * and among equals the order stays as it was.
 *
 * @param keys best first
 * @param mode of the song
 * @param instruments made in one key each; none changes nothing
 * @returns the same keys in their new order
 * @throws RangeError if a tonic is no note name
 */
export function fittingFirst<Key extends { tonic: string; beyond: boolean }>(
  keys: readonly Key[],
  mode: Mode,
  instruments: readonly FixedInstrument[],
): Key[] {
  const leftOut = ({ tonic }: Key) => instruments.filter((each) => !keyFit(each, { tonic, mode }).fits).length;
  return keys
    .map((key) => ({ key, missing: leftOut(key) }))
    .sort((a, b) => Number(a.key.beyond) - Number(b.key.beyond) || a.missing - b.missing)
    .map(({ key }) => key);
}
