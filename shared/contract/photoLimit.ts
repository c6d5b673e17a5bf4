/** Characters of an instrument's photo as it travels: about 90 KB of picture. */
export const longestPhoto = 120_000;
