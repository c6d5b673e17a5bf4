/** The sound of a take as a WAV file (16-bit mono PCM), for playing back on this device. */
export function takeSound(pcm: Float32Array, sampleRate: number): Blob {
  const bytes = new DataView(new ArrayBuffer(44 + 2 * pcm.length));
  const text = (at: number, word: string) =>
    [...word].forEach((letter, k) => bytes.setUint8(at + k, letter.charCodeAt(0)));
  text(0, "RIFF");
  bytes.setUint32(4, 36 + 2 * pcm.length, true);
  text(8, "WAVEfmt ");
  bytes.setUint32(16, 16, true);
  bytes.setUint16(20, 1, true);
  bytes.setUint16(22, 1, true);
  bytes.setUint32(24, sampleRate, true);
  bytes.setUint32(28, 2 * sampleRate, true);
  bytes.setUint16(32, 2, true);
  bytes.setUint16(34, 16, true);
  text(36, "data");
  bytes.setUint32(40, 2 * pcm.length, true);
  pcm.forEach((sample, k) => bytes.setInt16(44 + 2 * k, Math.round(Math.max(-1, Math.min(1, sample)) * 32767), true));
  return new Blob([bytes.buffer as ArrayBuffer], { type: "audio/wav" });
}
