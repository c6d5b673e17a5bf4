import fc from "fast-check";
import type { KeyScore, SingingVoice, Tune } from "@/shared/keys/keyScore";
import type { MelodyNote } from "@/shared/songs/melody";
import { tonicPitchClass } from "@/shared/music/keyName";

/** One law of the keys, as fast-check runs it. */
export interface KeyLaw {
  name: string;
  property: fc.IPropertyWithHooks<never>;
}

/** A law by its name; the property throws where the law is broken. */
export function law<Ts extends [unknown, ...unknown[]]>(name: string, property: fc.IPropertyWithHooks<Ts>): KeyLaw {
  return { name, property: property as unknown as fc.IPropertyWithHooks<never> };
}

export const anyNote = (midi: fc.Arbitrary<number>): fc.Arbitrary<MelodyNote> =>
  fc.record({ start: fc.constant(0), duration: fc.constantFrom(0.25, 0.5, 1, 1.5, 2, 4), midi });

export const anyTune = fc.record({
  kind: fc.constant("melody" as const),
  notes: fc.array(anyNote(fc.integer({ min: 50, max: 76 })), { minLength: 1, maxLength: 24 }),
  home: fc.constantFrom("C", "D", "Eb", "F#", "G", "A", "Bb"),
});

/** Edges in hundredths of a semitone, as a take gives them. */
export const cents = (low: number, high: number): fc.Arbitrary<number> =>
  fc.integer({ min: low * 100, max: high * 100 }).map((value) => value / 100);

export const anyVoice: fc.Arbitrary<SingingVoice> = fc
  .record({ low: cents(40, 58), below: cents(0, 6), width: cents(2, 18), above: cents(0, 8) })
  .map(({ low, below, width, above }) => ({
    range: { lowMidi: low, highMidi: low + below + width + above },
    comfort: { lowMidi: low + below, highMidi: low + below + width },
  }));

/** Keys found by the pitch class of their tonic. */
export function byTonic<K extends Pick<KeyScore, "tonic">>(keys: readonly K[]): Map<number, K> {
  return new Map(keys.map((key) => [tonicPitchClass(key.tonic), key]));
}

export function movedTune<T extends Extract<Tune, { kind: "melody" }>>(song: T, by: number): Tune {
  const names = ["C", "Db", "D", "Eb", "E", "F", "F#", "G", "Ab", "A", "Bb", "B"];
  const home = names[(((tonicPitchClass(song.home) + by) % 12) + 12) % 12]!;
  return { kind: "melody", home, notes: song.notes.map((note) => ({ ...note, midi: note.midi + by })) };
}

export function movedVoice({ range, comfort }: SingingVoice, by: number): SingingVoice {
  return {
    range: { lowMidi: range.lowMidi + by, highMidi: range.highMidi + by },
    comfort: { lowMidi: comfort.lowMidi + by, highMidi: comfort.highMidi + by },
  };
}
