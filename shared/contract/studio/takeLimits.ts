/** A recording handed in may have so many bytes, and last so long. They stand apart from the schema, which pages do without. */
export const mostTakeBytes = 20_000_000;
export const mostTakeS = 600;

export const tooLong = "A recording may last at most ten minutes.";
