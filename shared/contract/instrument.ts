import { z } from "zod";
import { longestPhoto } from "./photoLimit";

const note = z.string().regex(/^[A-G](#|b)?-?\d$/, "Name a string like A3 or F#4.");

const instrumentString = z.strictObject({
  note,
  gaugeIn: z.number().positive().max(0.3).nullable(),
  material: z.enum([
    "plain-steel",
    "nickel-wound",
    "phosphor-bronze",
    "brass-wound",
    "nylon",
    "fluorocarbon",
    "unknown",
  ]),
  scaleMm: z.number().min(100).max(2000).exactOptional(),
  startsAtFret: z.int().min(1).max(12).exactOptional(),
  /** note its set was made for, where it is kept at another one */
  madeFor: note.exactOptional(),
  /** strings of this kind side by side */
  inCourse: z.int().min(2).max(3).exactOptional(),
});

/** A small JPEG or WebP as a data address: the words before it and the first bytes of the picture must both say so. */
const photo = z
  .string()
  .max(longestPhoto, "A photo may have 90 KB at most.")
  .regex(
    /^data:image\/(?:jpeg;base64,\/9j\/|webp;base64,UklGR[g-v][A-Za-z0-9+/]{5}XRUJQ)(?:[A-Za-z0-9+/]{4})*(?:[A-Za-z0-9+/]{2}==|[A-Za-z0-9+/]{3}=)?$/,
    "A photo must be a JPEG or a WebP.",
  );

/** An instrument of one's own, kept in full so that it outlives its preset. */
export const ownInstrument = z.strictObject({
  id: z.uuid(),
  /** the preset it came from, if any */
  presetId: z.string().max(80).nullable(),
  name: z.string().trim().min(1, "Give the instrument a name.").max(80),
  strings: z.array(instrumentString).min(1).max(12),
  scaleMm: z.number().min(100).max(2000),
  frets: z.int().min(1).max(36),
  fretMap: z
    .array(z.int().min(1).max(60))
    .max(36)
    .refine((map) => map.every((semitones, k) => k === 0 || semitones > map[k - 1]!), "Frets rise along the neck.")
    .exactOptional(),
  capoTo: z.int().min(0).max(24),
  leftHanded: z.boolean(),
  favourite: z.boolean(),
  photo: photo.exactOptional(),
});
export type OwnInstrument = z.infer<typeof ownInstrument>;
