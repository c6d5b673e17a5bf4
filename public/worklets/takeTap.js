/**
 * Hands the microphone's mono sound on in blocks of 128 samples (3 ms at 48 kHz). The first message it gets carries the
 * port to write to, so that the blocks go straight to the worker and never wait for the page.
 */
class TakeTap extends AudioWorkletProcessor {
  constructor() {
    super();
    this.block = new Float32Array(128);
    this.filled = 0;
    this.out = null;
    this.open = true;
    this.port.onmessage = ({ data }) => {
      if (data.kind === "connect") this.out = data.port;
      if (data.kind === "finish") this.finish();
    };
  }

  finish() {
    if (!this.open) return;
    this.open = false;
    if (this.out) {
      const rest = this.block.slice(0, this.filled);
      this.out.postMessage({ kind: "block", pcm: rest }, [rest.buffer]);
      this.out.postMessage({ kind: "end" });
    }
    this.port.postMessage({ kind: "finished" });
  }

  process([input]) {
    if (!this.open) return false;
    const channel = input && input[0];
    if (!channel || !this.out) return true;
    for (let k = 0; k < channel.length; k += 1) {
      this.block[this.filled] = channel[k];
      this.filled += 1;
      if (this.filled === this.block.length) {
        this.out.postMessage({ kind: "block", pcm: this.block }, [this.block.buffer]);
        this.block = new Float32Array(128);
        this.filled = 0;
      }
    }
    return true;
  }
}
registerProcessor("take-tap", TakeTap);
