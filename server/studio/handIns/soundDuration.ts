/**
 * How many seconds a whole recording lasts, from its bytes and not from what was said of it; null where they do not tell, as
 * in WebM that a browser wrote while it recorded. Ogg and mp3 are read to their end. What reads them is loaded when it is
 * first needed.
 */
export async function soundDuration(sound: Uint8Array, mediaType: string): Promise<number | null> {
  const { parseBuffer } = await import("music-metadata");
  const read = await parseBuffer(sound, mediaType, { duration: true, skipCovers: true }).catch(() => null);
  return read?.format.duration ?? null;
}
