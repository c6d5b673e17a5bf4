import { z } from "zod";
import { pitchBand } from "./pitchBand";
import { shape } from "./shape";
import { song, tonicName } from "./song";

const key = song.shape.writtenKey.unwrap();
const name = z.string().max(80);
const strings = z
  .array(z.string().regex(/^[A-G](#|b)?-?\d$/, "Name a string like A3 or F#4."))
  .min(1)
  .max(12);

const sheet = z.strictObject({
  title: song.shape.title,
  facts: z.string().max(300),
  chart: song.shape.chart,
  from: key.nullable(),
  key: key.nullable(),
  singer: name.nullable(),
  firstNote: z
    .string()
    .regex(/^[A-G](#|b)?-?\d$/, "Name a note like C4 or F#3.")
    .nullable(),
  instrument: z
    .strictObject({
      name,
      strings,
      tuned: strings,
      fretNames: z.array(z.string().max(8)).max(40).nullable(),
      leftHanded: z.boolean(),
      retune: z.int().min(-12).max(12),
      capo: z.int().min(0).max(24),
      shapeKey: z.strictObject({ tonic: tonicName, mode: key.shape.mode }),
    })
    .nullable(),
  chords: z.array(z.strictObject({ written: name, sounding: name, played: name, shape: shape.nullable() })).max(200),
  strokes: z
    .strictObject({
      beats: z.int().min(1).max(16),
      quarters: z.number().positive().max(16),
      strokes: z
        .array(
          z.strictObject({
            at: z.number().min(0).max(16),
            kind: z.enum(["down", "up", "pluck", "bass"]),
            strong: z.boolean(),
          }),
        )
        .max(64),
      words: z.string().max(300),
    })
    .nullable(),
  tune: z
    .strictObject({
      range: pitchBand,
      comfort: pitchBand,
      comfortNames: z.strictObject({ low: z.string().max(8), high: z.string().max(8) }),
      marks: z
        .array(z.strictObject({ midi: z.number().min(0).max(127), share: z.number().min(0).max(1) }))
        .min(1)
        .max(128),
      words: z.string().max(600),
    })
    .nullable(),
  order: z.string().max(2000),
});

/** How a sheet is laid out; also kept on the device as the player's own habit. */
const sheetOptions = z.strictObject({
  paper: z.enum(["A4", "Letter"]),
  grids: z.enum(["side", "top", "none"]),
  numbers: z.boolean(),
  letters: z.enum(["small", "usual", "large", "largest"]),
  shows: z.enum(["played", "sounding"]),
  leftHanded: z.boolean(),
});

/** A sheet to be set as a PDF. */
export const sheetPdfRequest = z.strictObject({ sheet, options: sheetOptions });
export type SheetPdfRequest = z.infer<typeof sheetPdfRequest>;
