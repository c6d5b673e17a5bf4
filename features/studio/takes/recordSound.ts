import { waveform } from "@/shared/signal/waveform";

/** A recording that runs. */
export interface Recording {
  /** Ends it and gives what was recorded. */
  stop(): Promise<Blob>;
  /** Ends it and forgets it. */
  drop(): void;
}

/** Records spoken or sung sound as the browser makes it (webm or mp4); nothing is sent anywhere. */
export async function recordSound(): Promise<Recording> {
  const stream = await navigator.mediaDevices.getUserMedia({ audio: true });
  const recorder = new MediaRecorder(stream);
  const pieces: Blob[] = [];
  recorder.addEventListener("dataavailable", ({ data }) => pieces.push(data));
  recorder.start(1000);
  const release = () => stream.getTracks().forEach((track) => track.stop());
  return {
    stop: () =>
      new Promise((resolve) => {
        const end = () => {
          release();
          resolve(new Blob(pieces, { type: recorder.mimeType }));
        };
        // It ends by itself when the microphone is taken away.
        if (recorder.state === "inactive") return end();
        recorder.addEventListener("stop", end);
        recorder.stop();
      }),
    drop: () => {
      if (recorder.state !== "inactive") recorder.stop();
      release();
    },
  };
}

/** How long a recording is and how loud from beginning to end, read from its bytes. */
export async function readSound(sound: Blob): Promise<{ durationS: number; waveform: number[] }> {
  const buffer = await new OfflineAudioContext(1, 1, 24_000).decodeAudioData(await sound.arrayBuffer());
  return { durationS: buffer.duration, waveform: waveform(buffer.getChannelData(0)) };
}
