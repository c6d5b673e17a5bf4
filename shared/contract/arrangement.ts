import { z } from "zod";
import { decision } from "./decision";
import { shape } from "./shape";
import { tonicName } from "./song";

const chordName = z.string().max(80);

const pattern = z.strictObject({
  name: z.string().trim().max(60, "A name may have at most 60 characters."),
  /** the upper figure of the metre it is for */
  beats: z.int().min(1).max(16),
  /** one for each eighth of the bar */
  steps: z
    .array(z.enum(["down", "up", "bass", "pluck", "rest"]))
    .min(1)
    .max(32),
});

/** One way of playing a song in one key on one instrument: a shape for each chord, and what the right hand does. */
export const arrangement = z.strictObject({
  id: z.uuid(),
  songId: z.uuid(),
  name: z.string().trim().min(1, "Give the arrangement a name.").max(80, "A name may have at most 80 characters."),
  tonic: tonicName,
  /** semitones from the tune as written, octave included */
  shift: decision.shape.shift,
  /** preset or own instrument */
  instrument: z.string().min(1).max(80),
  way: decision.shape.way.unwrap(),
  /** the shapes, counted from nut or capo; null where the instrument has none */
  chords: z
    .array(z.strictObject({ written: chordName, sounding: chordName, played: chordName, shape: shape.nullable() }))
    .max(200),
  pattern,
  createdAt: z.iso.datetime(),
});
export type Arrangement = z.infer<typeof arrangement>;
