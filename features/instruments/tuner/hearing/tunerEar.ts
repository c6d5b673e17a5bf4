/** What a page that listens may be told. */
type TunerEarEvent = { kind: "interrupted"; cause: string } | { kind: "unavailable"; why: string };

/** The microphone as the page is given it: one at a time, opened, listened to and let go. */
export interface TunerEar {
  open(): Promise<{ sampleRate: number } | null>;
  listen(sound: MessagePort): void;
  release(): void;
}

/** Makes an ear; `live.atMs` tells it when sound last came, so that it notices when none does. */
export type CreateTunerEar = (emit: (event: TunerEarEvent) => void, live: { atMs: number }) => TunerEar;

/** A steady tone to tune by. */
export interface TunerTone {
  play(midi: number): Promise<void>;
  stop(): void;
  close(): void;
}
