const steps = [
  "nothing",
  "a semitone",
  "a whole tone",
  "three semitones",
  "four semitones",
  "five semitones",
  "six semitones",
  "seven semitones",
  "eight semitones",
  "nine semitones",
  "ten semitones",
  "eleven semitones",
];

/**
 * Size of a move in words.
 *
 * @param semitones whole semitones; the sign is ignored
 * @returns such as "a whole tone" or "an octave and a semitone"; "nothing" for 0
 * @throws RangeError if semitones is not a whole number
 * @example distanceWords(-2) // => "a whole tone"
 */
export function distanceWords(semitones: number): string {
  if (!Number.isInteger(semitones)) throw new RangeError("a distance in words needs whole semitones");
  const size = Math.abs(semitones);
  const octaves = Math.floor(size / 12);
  const rest = steps[size % 12] ?? "";
  if (octaves === 0) return rest;
  const whole = octaves === 1 ? "an octave" : `${octaves} octaves`;
  return size % 12 === 0 ? whole : `${whole} and ${rest}`;
}

/**
 * A number of semitones, as a number.
 *
 * @param count how many
 * @returns such as "1 semitone" or "14 semitones"
 * @example semitoneWords(1) // => "1 semitone"
 */
export function semitoneWords(count: number): string {
  return `${count} ${count === 1 ? "semitone" : "semitones"}`;
}

/**
 * Where a key lies from the one the chart is written in, as a phrase.
 *
 * @param semitones whole semitones from the written key; negative = lower
 * @returns such as "a whole tone under the chart"; "as the chart is written" for 0
 * @throws RangeError if semitones is not a whole number
 * @example moveWords(-2) // => "a whole tone under the chart"
 */
export function moveWords(semitones: number): string {
  if (semitones === 0) return "as the chart is written";
  return `${distanceWords(semitones)} ${semitones < 0 ? "under" : "over"} the chart`;
}

/**
 * The same in as few signs as a table column wants.
 *
 * @param semitones whole semitones from the written key; negative = lower
 * @returns such as "7 down", "2 up", "written" or "an octave down"
 * @throws RangeError if semitones is not a whole number
 * @example shortMove(-7) // => "7 down"
 */
export function shortMove(semitones: number): string {
  if (!Number.isInteger(semitones)) throw new RangeError("a distance in words needs whole semitones");
  if (semitones === 0) return "written";
  if (semitones % 12 === 0) return `${distanceWords(semitones)} ${semitones < 0 ? "down" : "up"}`;
  return `${Math.abs(semitones)} ${semitones < 0 ? "down" : "up"}`;
}
