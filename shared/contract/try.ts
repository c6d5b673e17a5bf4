import { z } from "zod";
import { tonicName } from "./song";

const midi = z.number().min(0).max(127);
const share = z.number().min(0).max(1.0001);
const cents = z.number().min(0).max(1200).nullable();
const sentence = z.string().max(500);
const seconds = z.number().min(0).max(7200);

const measures = {
  sungShare: share,
  offCents: cents,
  inTune: share.nullable(),
  fellShort: z
    .strictObject({
      midi,
      semitones: z.number().min(-127).max(127).nullable(),
      side: z.enum(["above", "below"]),
    })
    .nullable(),
  unsteady: z.number().min(0).max(1e6).nullable(),
  ranOutOfLow: z.strictObject({ midi, why: z.enum(["left out", "weak"]) }).nullable(),
};

const phrase = z.strictObject({
  ...measures,
  phrase: z.int().min(0).max(10_000),
  label: z.string().max(2000).nullable(),
  lowMidi: midi,
  highMidi: midi,
  leftOut: z.boolean(),
  start: seconds.nullable(),
  end: seconds.nullable(),
  sentence,
});

const pitch = z.strictObject({
  midi,
  wantedS: seconds,
  sungS: seconds,
  offCents: cents,
  fellShort: z.enum(["above", "below"]).nullable(),
});

/** A take held against the tune in a key, as numbers and sentences. */
const takeMeasures = z.strictObject({
  ...measures,
  octaves: z.int().min(-10).max(10),
  moved: z.int().min(-12).max(12),
  tuningCents: z.number().min(-600).max(600),
  phrases: z.array(phrase).max(1000).readonly(),
  pitches: z.array(pitch).max(1000).readonly(),
  summary: z.array(sentence).max(10).readonly(),
});

/** A song sung in a key: what was measured and how it felt. The sound itself stays on the device. */
export const songTry = z.strictObject({
  id: z.uuid(),
  songId: z.uuid(),
  voiceId: z.uuid().nullable(),
  tonic: tonicName,
  /** semitones from the tune as written, octave included */
  shift: z.int().min(-48).max(48),
  /** beats a minute, where it is known */
  tempo: z.number().min(20).max(400).exactOptional(),
  /** whether it was sung to the backing */
  backing: z.boolean(),
  sungAt: z.iso.datetime(),
  /** how it felt: 1 easy to 5 straining; null while unanswered */
  effort: z.int().min(1).max(5).nullable(),
  /** null where there is no tune to measure by */
  measures: takeMeasures.nullable(),
});
export type Try = z.infer<typeof songTry>;
