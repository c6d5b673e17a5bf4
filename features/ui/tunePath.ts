/** The address of the tuner for one way of playing an instrument: semitones of the retune, fret of the capo. */
export function tunePath(instrumentId: string, retune = 0, capo = 0): `/instruments/tune?${string}` {
  const asked = new URLSearchParams({ instrument: instrumentId });
  if (retune !== 0) asked.set("retune", String(retune));
  if (capo !== 0) asked.set("capo", String(capo));
  return `/instruments/tune?${asked}`;
}
