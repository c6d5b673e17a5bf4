/** What the five answers to "How did that feel?" mean. */
export const effortWords = ["easy", "light", "some work", "hard work", "straining"] as const;
