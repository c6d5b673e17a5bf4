import type { PlayerWishes } from "@/shared/contract/playerWishes";
import type { Instrument } from "@/shared/instruments/instrument";
import { tuningMark } from "@/shared/ways/shapeMark";
import type { WayPreferences } from "@/shared/ways/way";

/** What the player would rather do without, and the shapes they know. Safety is no wish: unsafe ways never come. */
export type Wishes = Omit<PlayerWishes, "id" | "changedAt">;

export const usualWishes: Wishes = {
  noBarre: false,
  noCapo: false,
  neverRetune: false,
  keepRinging: false,
  highestCapo: 7,
  known: [],
};

/** Wishes as the engine weighs them on one instrument. */
export function preferencesOf(wishes: Wishes, instrument: Instrument): WayPreferences {
  return {
    barre: wishes.noBarre ? 1 : 0.2,
    capo: wishes.noCapo ? 1 : 0.2,
    retune: wishes.neverRetune ? 1 : 0.1,
    ringing: wishes.keepRinging ? 1 : 0,
    knownShapes: [],
    knownMarks: knownOn(wishes, instrument),
    highestCapo: wishes.highestCapo,
  };
}

/** The shapes known on an instrument: those of every other one whose strings stand to each other alike. */
export function knownOn(wishes: Wishes, instrument: Instrument): readonly string[] {
  const tuning = tuningMark(instrument);
  return wishes.known.find((each) => each.tuning === tuning)?.shapes ?? [];
}

/** The same wishes with one shape known or not known any more. */
export function withShape(wishes: Wishes, instrument: Instrument, mark: string, known: boolean): Wishes {
  const tuning = tuningMark(instrument);
  const shapes = knownOn(wishes, instrument).filter((each) => each !== mark);
  const others = wishes.known.filter((each) => each.tuning !== tuning);
  const next = known ? [...shapes, mark] : shapes;
  return { ...wishes, known: next.length === 0 ? others : [...others, { tuning, shapes: next }] };
}

/** One set of wishes out of those that came together from several devices: the newest switches, and every known shape. */
export function merged(sets: readonly PlayerWishes[]): Wishes {
  const [newest] = [...sets].sort((a, b) => b.changedAt.localeCompare(a.changedAt));
  if (!newest) return usualWishes;
  const { id: _id, changedAt: _changedAt, ...wishes } = newest;
  const shapes = new Map<string, Set<string>>();
  for (const each of sets.flatMap(({ known }) => known))
    shapes.set(each.tuning, new Set([...(shapes.get(each.tuning) ?? []), ...each.shapes]));
  return { ...wishes, known: [...shapes].map(([tuning, marks]) => ({ tuning, shapes: [...marks] })) };
}

/** The wishes in one line, for the head of the fold that holds them. */
export function wishWords(wishes: Wishes, instrument: Instrument): string {
  const known = knownOn(wishes, instrument).length;
  const parts = [
    wishes.noBarre && "no barre",
    wishes.noCapo && "no capo",
    wishes.neverRetune && "never retune on stage",
    wishes.keepRinging && "strings ringing",
    known > 0 && `${known} ${known === 1 ? "shape" : "shapes"} you know`,
  ].filter((word) => word !== false);
  return [...parts, `capo ${wishes.highestCapo} or lower`].join(", ");
}
