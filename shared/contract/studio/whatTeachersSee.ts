// Apart from the schemas: a page that only says it needs no validator.

/** The sentences under which a pupil agrees; the same for everybody, also for a guardian. */
export const whatTeachersSee = (recordingsKeptDays: number): string[] => [
  "Your name in this studio.",
  "The range and the comfort band of your voice, and when they were measured; not the recordings they come from.",
  "Your favourite instrument, and your wishes and known shapes for it.",
  "The songs your teachers gave you, with the key and the way you have them in.",
  "The takes you hand in: the sound, what was measured in it and how it felt; nothing you sing without handing it in.",
  "What you write to your teachers.",
  `Recordings are deleted ${recordingsKeptDays === 1 ? "one day" : `${recordingsKeptDays} days`} after you hand them in.`,
  "Other pupils see nothing of this. You can take your word back at any time; from that moment your teachers see only your name, and recordings you handed in are deleted.",
];
