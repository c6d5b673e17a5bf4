import { z } from "zod";

export const tonicName = z.string().regex(/^[A-G](#|b)?$/, "Name the key by a letter from A to G, with # or b if needed.");
const mode = z.enum(["major", "minor", "dorian", "phrygian", "lydian", "mixolydian", "locrian"]);

const melodyNote = z.strictObject({
  start: z.number().min(0),
  duration: z.number().positive(),
  midi: z.number().min(0).max(127),
});

/** The tune of a song: all its notes, or only its span. */
const tune = z.discriminatedUnion("kind", [
  z.strictObject({ kind: z.literal("melody"), notes: z.array(melodyNote).min(1).max(10_000), home: tonicName }),
  z
    .strictObject({
      kind: z.literal("span"),
      lowMidi: z.number().min(0).max(127),
      highMidi: z.number().min(0).max(127),
      home: tonicName,
    })
    .refine((span) => span.lowMidi <= span.highMidi, { message: "The lowest note must not be above the highest." }),
]);

/** A song on the shelf. */
export const song = z.strictObject({
  id: z.uuid(),
  title: z.string().trim().min(1, "Give the song a title.").max(200),
  /** chords over lyrics, as typed */
  chart: z.string().max(100_000, "A chart may have at most 100,000 characters."),
  writtenKey: z.strictObject({ tonic: tonicName, mode }).nullable(),
  tune: tune.nullable(),
  beatsPerBar: z.int().min(1).max(16).nullable(),
  tempo: z.number().min(20).max(400).nullable(),
  /** which song of the demonstration this is a copy of; null for a song of one's own */
  demo: z.string().max(40).nullable(),
  createdAt: z.iso.datetime(),
});
export type Song = z.infer<typeof song>;
