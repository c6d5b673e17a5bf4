/** What the address of the tuner asks for; what is no number there counts as nothing asked. */
export function tuneWishes(asked: { retune?: string; capo?: string; a4?: string }): {
  retune: number;
  capo: number;
  a4: number;
} {
  return {
    retune: within(asked.retune, -7, 7, 0),
    capo: within(asked.capo, 0, 12, 0),
    a4: within(asked.a4, 400, 480, 440),
  };
}

function within(text: string | undefined, least: number, most: number, otherwise: number): number {
  const value = Number(text);
  return text !== undefined && Number.isInteger(value) && value >= least && value <= most ? value : otherwise;
}
