import { z } from "zod";

export const tonicName = z
  .string()
  .regex(/^[A-G](#|b)?$/, "Name the key by a letter from A to G, with # or b if needed.");
const mode = z.enum(["major", "minor", "dorian", "phrygian", "lydian", "mixolydian", "locrian"]);

const melodyNote = z.strictObject({
  start: z.number().min(0),
  duration: z.number().positive(),
  midi: z.number().min(0).max(127),
  /** the syllable sung on it */
  lyric: z.string().max(100).exactOptional(),
});

const tag = z.string().trim().min(1, "A tag needs a name.").max(40, "A tag may have at most 40 characters.");
const allDiffer = (tags: string[]) => new Set(tags.map((name) => name.toLowerCase())).size === tags.length;

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
  tags: z
    .array(tag)
    .max(20, "A song may have at most 20 tags.")
    .refine(allDiffer, { message: "The same tag stands here twice." }),
  /** when it was put aside; null while it stands on the shelf */
  archivedAt: z.iso.datetime().nullable(),
  /** when it was last played, if ever */
  playedAt: z.iso.datetime().nullable(),
  createdAt: z.iso.datetime(),
  /**
   * Counted up by the place that keeps the song at each change; 0 = never kept. A change that names another revision
   * than the kept one is refused ("changed-elsewhere"), unless it changes nothing.
   */
  revision: z.int().min(0).max(2_147_483_646),
});
export type Song = z.infer<typeof song>;
