import { z } from "zod";
import { tonicName } from "./song";

/** Somebody who plays along. */
const player = z.strictObject({
  id: z.uuid(),
  name: z.string().trim().min(1, "Say who plays.").max(80),
  /** a preset, an own instrument, or one made in one key, such as "whistle-D" */
  instrument: z.string().min(1).max(80),
  /** the way they chose, and the key that it leads to; null where the best one is meant */
  way: z
    .strictObject({
      into: tonicName,
      retune: z.int().min(-12).max(12),
      capo: z.int().min(0).max(24),
      shapeKey: tonicName,
    })
    .nullable(),
});
export type Player = z.infer<typeof player>;

/** How many play one song together. */
export const mostPlayers = 24;

/** Who plays a song and on what: one for each song. */
export const lineUp = z.strictObject({
  id: z.uuid(),
  songId: z.uuid(),
  players: z.array(player).max(mostPlayers, `At most ${mostPlayers} play one song.`),
  changedAt: z.iso.datetime(),
});
export type LineUp = z.infer<typeof lineUp>;

/** Two line-ups of one song as one: the players of the later one, and behind them those that only the other has. */
export function joinedLineUps(a: LineUp, b: LineUp): LineUp {
  const [later, earlier] = Date.parse(a.changedAt) >= Date.parse(b.changedAt) ? [a, b] : [b, a];
  const more = earlier.players.filter(({ id }) => !later.players.some((each) => each.id === id));
  return { ...later, players: [...later.players, ...more].slice(0, mostPlayers) };
}
