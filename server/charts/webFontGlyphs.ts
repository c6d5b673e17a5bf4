type Step = { command: string; args: number[] };

interface Subset {
  font: { getGlyph(id: number): { path: { commands: Step[] }; advanceWidth: number } };
  glyf: Uint8Array[];
  loca: { offsets: number[]; version: number };
  hmtx: { metrics: { advance: number; bearing: number }[] };
  offset: number;
  _addGlyph(id: number): number;
}

interface Point {
  x: number;
  y: number;
  onCurve: boolean;
}

/**
 * Lets a part of a WOFF2 font be embedded. fontkit copies glyphs from a table that WOFF2 keeps in another form; here
 * each glyph, accents and all, is written anew from its outline, as the TrueType table "glyf" has it.
 *
 * @see https://learn.microsoft.com/en-us/typography/opentype/spec/glyf
 */
export function writeGlyphsFromOutlines(subset: object): void {
  const target = subset as Subset;
  target._addGlyph = (id) => {
    const { path, advanceWidth } = target.font.getGlyph(id);
    const contours = contoursOf(path.commands);
    const bytes = contours.length > 0 ? encode(contours) : new Uint8Array(0);
    target.loca.version = 1;
    target.loca.offsets.push(target.offset);
    target.glyf.push(bytes);
    const left = contours.flat().map(({ x }) => x);
    target.hmtx.metrics.push({ advance: advanceWidth, bearing: left.length > 0 ? Math.min(...left) : 0 });
    target.offset += bytes.length;
    return target.glyf.length - 1;
  };
}

function contoursOf(steps: readonly Step[]): Point[][] {
  const contours: Point[][] = [];
  for (const { command, args } of steps) {
    if (command === "moveTo") contours.push([]);
    // The last two numbers are where a step arrives; those before steer a curve.
    for (let k = 0; k < args.length; k += 2)
      contours.at(-1)?.push({
        x: Math.round(args[k] ?? 0),
        y: Math.round(args[k + 1] ?? 0),
        onCurve: k === args.length - 2,
      });
  }
  return contours.filter((points) => points.length > 1);
}

function encode(contours: readonly Point[][]): Uint8Array {
  const points = contours.flat();
  const [xs, ys] = [points.map(({ x }) => x), points.map(({ y }) => y)];
  const length = 10 + 2 * contours.length + 2 + 5 * points.length;
  const bytes = Buffer.alloc(Math.ceil(length / 4) * 4);
  let at = 0;
  const write = (value: number) => (at = bytes.writeInt16BE(value, at));
  for (const value of [contours.length, Math.min(...xs), Math.min(...ys), Math.max(...xs), Math.max(...ys)])
    write(value);
  let last = -1;
  for (const { length: count } of contours) write((last += count));
  write(0);
  for (const { onCurve } of points) at = bytes.writeUInt8(onCurve ? 1 : 0, at);
  for (const values of [xs, ys]) values.forEach((value, k) => write(value - (values[k - 1] ?? 0)));
  return bytes;
}
