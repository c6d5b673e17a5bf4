/**
 * How many seconds a recording lasts: where the last piece of its sound ends, found by going through all of them and not by
 * what its head or its sender says, as what a browser writes while it records has no duration in its head. Null for what
 * cannot be read so. What reads it is loaded when it is first needed.
 */
export async function soundDuration(sound: Uint8Array): Promise<number | null> {
  const media = await import("mediabunny");
  const { FLAC, MP3, MP4, OGG, WAVE, WEBM } = media;
  const input = new media.Input({
    source: new media.BufferSource(sound),
    formats: [FLAC, MP3, MP4, OGG, WAVE, WEBM],
  });
  let end = 0;
  try {
    const track = await input.getPrimaryAudioTrack();
    if (!track) return null;
    const packets = new media.EncodedPacketSink(track).packets(undefined, undefined, { metadataOnly: true });
    for await (const { timestamp, duration } of packets) end = Math.max(end, timestamp + duration);
  } catch {
    return null;
  }
  return end || null;
}
