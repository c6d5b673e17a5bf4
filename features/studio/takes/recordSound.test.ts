import { recordSound } from "./recordSound";

/** A recorder that ends by itself when the microphone is taken away. */
class Recorder extends EventTarget {
  static made: Recorder;
  state = "inactive";
  mimeType = "audio/webm";
  constructor() {
    super();
    Recorder.made = this;
  }
  start(): void {
    this.state = "recording";
  }
  stop(): void {
    if (this.state === "inactive") throw new Error("It does not record.");
    this.end();
  }
  end(): void {
    this.state = "inactive";
    this.dispatchEvent(Object.assign(new Event("dataavailable"), { data: new Blob(["sound"]) }));
    this.dispatchEvent(new Event("stop"));
  }
}

const stopped = jest.fn();
beforeEach(() => {
  stopped.mockClear();
  globalThis.MediaRecorder = Recorder as never;
  Object.defineProperty(navigator, "mediaDevices", {
    configurable: true,
    value: { getUserMedia: async () => ({ getTracks: () => [{ stop: stopped }] }) },
  });
});

it("gives what was recorded, and lets the microphone go", async () => {
  const recording = await recordSound();
  expect((await recording.stop()).size).toBe(5);
  expect(stopped).toHaveBeenCalledTimes(1);
});

it("gives it also when the recorder has ended by itself", async () => {
  const recording = await recordSound();
  Recorder.made.end();
  expect((await recording.stop()).size).toBe(5);
  expect(stopped).toHaveBeenCalledTimes(1);
});
