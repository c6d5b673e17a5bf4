import { z } from "zod";

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

/** An instrument of one's own, kept in full so that it outlives its preset. */
export const ownInstrument = z.strictObject({
  id: z.uuid(),
  /** the preset it came from, if any */
  presetId: z.string().max(80).nullable(),
  name: z.string().trim().min(1, "Give the instrument a name.").max(80),
  strings: z.array(instrumentString).min(1).max(12),
  scaleMm: z.number().min(100).max(2000),
  frets: z.int().min(1).max(36),
  fretMap: z.array(z.int().min(1).max(60)).max(36).exactOptional(),
  capoTo: z.int().min(0).max(24),
  leftHanded: z.boolean(),
  favourite: z.boolean(),
});
export type OwnInstrument = z.infer<typeof ownInstrument>;
