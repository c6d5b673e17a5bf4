/** How a take that was handed in felt. */
export interface SungEffort {
  at: Date;
  effort: number | null;
  /** it fell short of high notes; null where nothing was measured */
  strained: boolean | null;
}

const hard = 4;

/**
 * What a teacher should look after, from the newest two takes handed in, newest first. From 4 of 5 on, singing counts as
 * hard (the scale of effort that takes are rated on).
 */
export function rosterWarnings(sung: readonly SungEffort[], changing: boolean): string[] {
  const felt = sung.map(({ effort }) => effort ?? 0);
  const warnings: string[] = [];
  if (felt.length > 1 && felt.every((effort) => effort >= hard)) {
    const sameNotes = sung.every(({ strained }) => strained === true);
    warnings.push(sameNotes ? "hard twice, same high notes" : "hard twice");
  } else if (felt[0] === 5) warnings.push("very hard last time");
  if (changing) warnings.push("voice is changing: measure again");
  return warnings;
}
