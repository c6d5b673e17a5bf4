import { type Decision, type EarlierChoice, mostEarlier } from "./decision";

const instant = ({ decidedAt }: EarlierChoice) => Date.parse(decidedAt);

/** The choice that a decision holds at present, without its history and ids. */
export function presentChoice(decision: Decision): EarlierChoice {
  const { tonic, shift, score, reason, instrument, way, decidedAt } = decision;
  return { tonic, shift, score, reason, instrument, way, decidedAt };
}

/**
 * Two decisions for the same song and voice, made apart, as one: the later choice is the present one, and all others are
 * its history. It keeps the id of the first.
 */
export function joined(first: Decision, second: Decision): Decision {
  const [later, other] = instant(second) > instant(first) ? [second, first] : [first, second];
  const choices = new Map(
    [...other.earlier, presentChoice(other), ...later.earlier].map((each) => [instant(each), each] as const),
  );
  choices.delete(instant(later));
  const earlier = [...choices.values()].sort((a, b) => instant(b) - instant(a)).slice(0, mostEarlier);
  return { ...later, id: first.id, earlier };
}

/**
 * A decision on its way in, with the history of what it takes the place of: of a state the sender did not know, or of a
 * decision that another device made for the same song and voice. Going back to a choice in the history is left as sent.
 */
export function withHistory(next: Decision, replaced: Decision): Decision {
  const at = instant(next);
  if (next.id === replaced.id && replaced.earlier.some((each) => instant(each) === at)) return next;
  const known = new Set([at, ...next.earlier.map(instant)]);
  const present = presentChoice(replaced);
  if (known.has(instant(present))) return next;
  const unknown = [present, ...replaced.earlier].filter((each) => !known.has(instant(each)));
  const earlier = [...next.earlier, ...unknown].sort((a, b) => instant(b) - instant(a)).slice(0, mostEarlier);
  return { ...next, earlier };
}
