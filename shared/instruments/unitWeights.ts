import type { StringMaterial } from "./instrument";

/** Materials whose weight is published per gauge. */
export type WeighedMaterial = Exclude<StringMaterial, "unknown" | "fluorocarbon">;

/** Unit weights in 1e-5 lb per inch, by gauge in thousandths of an inch. */
type WeightTable = readonly (readonly [thousandths: number, weight: number])[];

/**
 * Weight of strings by gauge, as one maker prints them; other makers differ by about 5 % (plain) to 8 % (wound).
 *
 * @see D'Addario, string tension chart 13934 (unit weights PL, NW, PB, BW, NYL)
 */
export const unitWeightTables: Readonly<Record<WeighedMaterial, WeightTable>> = {
  "plain-steel": [
    [7, 1.085],
    [8, 1.418],
    [8.5, 1.601],
    [9, 1.794],
    [9.5, 1.999],
    [10, 2.215],
    [10.5, 2.442],
    [11, 2.68],
    [11.5, 2.93],
    [12, 3.19],
    [13, 3.744],
    [13.5, 4.037],
    [14, 4.342],
    [15, 4.984],
    [16, 5.671],
    [17, 6.402],
    [18, 7.177],
    [19, 7.997],
    [20, 8.861],
    [22, 10.722],
    [24, 12.76],
    [26, 14.975],
  ],
  "nickel-wound": [
    [17, 5.524],
    [18, 6.215],
    [19, 6.947],
    [20, 7.495],
    [21, 8.293],
    [22, 9.184],
    [24, 10.857],
    [26, 12.671],
    [28, 14.666],
    [30, 17.236],
    [32, 19.347],
    [34, 21.59],
    [36, 23.964],
    [38, 26.471],
    [39, 27.932],
    [42, 32.279],
    [44, 35.182],
    [46, 38.216],
    [48, 41.382],
    [49, 43.014],
    [52, 48.109],
    [54, 53.838],
    [56, 57.598],
    [59, 64.191],
    [60, 66.542],
    [62, 70.697],
    [64, 74.984],
    [66, 79.889],
    [68, 84.614],
    [70, 89.304],
    [72, 94.124],
    [74, 98.869],
    [80, 115.011],
  ],
  "phosphor-bronze": [
    [20, 8.106],
    [21, 8.944],
    [22, 9.876],
    [23, 10.801],
    [24, 11.682],
    [25, 12.686],
    [26, 13.64],
    [27, 14.834],
    [29, 17.381],
    [30, 18.66],
    [32, 21.018],
    [34, 23.887],
    [35, 25.365],
    [36, 26.83],
    [39, 31.125],
    [42, 36.722],
    [45, 41.751],
    [47, 45.289],
    [49, 49.151],
    [52, 55.223],
    [53, 56.962],
    [56, 63.477],
    [59, 70.535],
    [60, 73.039],
    [62, 77.682],
    [64, 82.78],
    [66, 87.718],
    [70, 96.833],
  ],
  "brass-wound": [
    [20, 7.862],
    [22, 9.6],
    [24, 11.353],
    [26, 13.253],
    [29, 16.838],
    [30, 18.092],
    [32, 20.352],
    [35, 24.006],
    [36, 25.417],
    [39, 30.063],
    [42, 34.808],
    [45, 40.245],
    [47, 43.634],
    [49, 47.368],
    [52, 53.224],
    [53, 54.852],
    [56, 61.132],
    [59, 68.005],
  ],
  nylon: [
    [22, 1.368],
    [24, 1.628],
    [28, 2.216],
    [32, 2.894],
    [34, 3.267],
    [40, 4.522],
  ],
};

/**
 * Where the table does not reach: weight = k times diameter squared, k in lb per cubic inch.
 *
 * @see fitted to D'Addario's chart 13934; for fluorocarbon to a maker's measurements of six strings
 */
export const weightFits: Readonly<Record<Exclude<StringMaterial, "unknown">, number>> = {
  "plain-steel": 0.2215,
  "nickel-wound": 0.1848,
  "phosphor-bronze": 0.204,
  "brass-wound": 0.1973,
  nylon: 0.0283,
  fluorocarbon: 0.0518,
};

/**
 * Weight of one inch of string.
 *
 * @param material what it is made of
 * @param gaugeIn diameter in inches, > 0
 * @returns lb per inch: the printed value, between two printed gauges the interpolated one, outside the fitted one;
 *   null for an unknown material
 * @throws RangeError if the gauge is not positive
 * @see D'Addario, string tension chart 13934
 * @example unitWeight("plain-steel", 0.012) // => 0.0000319
 */
export function unitWeight(material: StringMaterial, gaugeIn: number): number | null {
  if (!(gaugeIn > 0)) throw new RangeError("gaugeIn must be a positive diameter in inches");
  if (material === "unknown") return null;
  const thousandths = Math.round(gaugeIn * 1e5) / 100;
  if (material !== "fluorocarbon") {
    const table = unitWeightTables[material];
    const above = table.findIndex(([gauge]) => gauge >= thousandths);
    const upper = table[above];
    if (upper?.[0] === thousandths) return Number((upper[1] * 1e-5).toPrecision(9));
    const lower = table[above - 1];
    if (upper && lower) {
      // Weight grows with the square of the diameter, so the fit's factor is what is interpolated.
      const part = (thousandths - lower[0]) / (upper[0] - lower[0]);
      const factor = (lower[1] / lower[0] ** 2) * (1 - part) + (upper[1] / upper[0] ** 2) * part;
      return factor * thousandths ** 2 * 1e-5;
    }
  }
  return weightFits[material] * gaugeIn ** 2;
}
