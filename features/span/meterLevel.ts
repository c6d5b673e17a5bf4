const stepDb = 2.5;
const cutOffFrom = 0.99;

/** What the level meter shows: steps of 2.5 dB; a cut-off peak is too loud, however soft the block around it. */
export function meterLevel({ peak, levelDb }: { peak: number; levelDb: number }): number {
  return peak >= cutOffFrom ? 0 : Math.round(levelDb / stepDb) * stepDb;
}
