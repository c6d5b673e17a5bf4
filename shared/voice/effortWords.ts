/**
 * What the five answers to "How did that feel?" mean, from 1 on.
 *
 * @example effortWords[1 - 1] // => "easy"
 */
export const effortWords = ["easy", "light", "some work", "hard work", "straining"] as const;
