/** How lengths and tensions are told: mm, kg and N, or inches and pounds. */
export type Units = "metric" | "imperial";

const mmPerInch = 25.4;
const kgPerLb = 0.45359237;
const newtonsPerLb = 4.4482216152605;
/** Makers print scales in sixteenths of an inch. */
const sixteenths = 16;
/** A length kept in tenths of a millimetre is no more exact than this. */
const exactMm = 0.06;

/**
 * A length as a bare number in somebody's units.
 *
 * @param mm length in millimetres
 * @param units how lengths are told
 * @returns mm to a tenth; inches to a thousandth, or to the sixteenth that the length stands for
 * @example lengthNumber(647.7, "imperial") // => "25.5"
 */
export function lengthNumber(mm: number, units: Units): string {
  if (units === "metric") return String(Math.round(mm * 10) / 10);
  const inches = mm / mmPerInch;
  const printed = Math.round(inches * sixteenths) / sixteenths;
  const near = Math.abs(printed - inches) * mmPerInch <= exactMm;
  return String(near ? printed : Math.round(inches * 1000) / 1000);
}

/**
 * A length with its unit.
 *
 * @param mm length in millimetres
 * @param units how lengths are told
 * @returns such as "648 mm" or "25.5 in"
 * @example lengthWords(647.7, "metric") // => "648 mm"
 */
export function lengthWords(mm: number, units: Units): string {
  return units === "metric" ? `${Math.round(mm)} mm` : `${lengthNumber(mm, units)} in`;
}

/**
 * The millimetres that a person typed.
 *
 * @param text a number, with a point or a comma
 * @param units what it is in
 * @returns mm to a tenth, or null if this is no positive number
 * @example readLength("25.5", "imperial") // => 647.7
 */
export function readLength(text: string, units: Units): number | null {
  const value = readNumber(text);
  return value === null ? null : Math.round(value * (units === "metric" ? 1 : mmPerInch) * 10) / 10;
}

/**
 * A string's thickness as a bare number.
 *
 * @param gaugeIn diameter in inches
 * @param units how lengths are told
 * @returns such as "1.067" (mm) or ".042" (inches)
 * @example gaugeNumber(0.042, "imperial") // => ".042"
 */
export function gaugeNumber(gaugeIn: number, units: Units): string {
  if (units === "metric") return String(Math.round(gaugeIn * mmPerInch * 1000) / 1000);
  return gaugeIn.toFixed(4).replace(/0$/, "").replace(/^0/, "");
}

/**
 * A string's thickness with its unit.
 *
 * @param gaugeIn diameter in inches
 * @param units how lengths are told
 * @returns such as "1.07 mm" or ".042 in"
 * @example gaugeWords(0.042, "metric") // => "1.07 mm"
 */
export function gaugeWords(gaugeIn: number, units: Units): string {
  return units === "metric" ? `${(gaugeIn * mmPerInch).toFixed(2)} mm` : `${gaugeNumber(gaugeIn, units)} in`;
}

/**
 * The gauge that a person typed.
 *
 * @param text a number, with a point or a comma
 * @param units what it is in
 * @returns inches to a ten-thousandth, or null if this is no positive number
 * @example readGauge("1.067", "metric") // => 0.042
 */
export function readGauge(text: string, units: Units): number | null {
  const value = readNumber(text);
  return value === null ? null : Math.round((units === "metric" ? value / mmPerInch : value) * 1e4) / 1e4;
}

/**
 * A tension with its unit.
 *
 * @param lb pounds-force
 * @param units how tensions are told
 * @returns such as "10.3 kg" or "22.8 lb"
 * @example tensionWords(22.8, "metric") // => "10.3 kg"
 */
export function tensionWords(lb: number, units: Units): string {
  return units === "metric" ? `${(lb * kgPerLb).toFixed(1)} kg` : `${lb.toFixed(1)} lb`;
}

/**
 * A tension in newtons, for those who compute with it.
 *
 * @param lb pounds-force
 * @returns whole newtons with the unit
 * @see 1 lbf = 4.4482216152605 N, by the definition of the pound and standard gravity
 * @example newtonWords(22.8) // => "101 N"
 */
export function newtonWords(lb: number): string {
  return `${Math.round(lb * newtonsPerLb)} N`;
}

function readNumber(text: string): number | null {
  const plain = text.trim().replace(",", ".");
  const value = /^\d*\.?\d+$|^\d+\.$/.test(plain) ? Number(plain) : NaN;
  return value > 0 ? value : null;
}
