import type { BackingEvent, BackingPlan } from "@/shared/songs/backing/backingPlan";
import { midiToHz } from "@/shared/music/pitch";
import { pluckString, type StringSound } from "@/shared/music/pluckedString";

const guitar: StringSound = { decayS: 2.6, bright: 0.55, lengthS: 3 };
const bass: StringSound = { decayS: 2.2, bright: 0.12, lengthS: 2.4 };
const gains = { string: 0.1, pluck: 0.18, bass: 0.2, click: 0.42, guide: 0.2 } as const;
/** From string to string of a stroke; an upstroke is quicker and lighter. */
const strumS = { down: 0.011, up: 0.007 } as const;
const dampS = 0.05;
const clickS = 0.035;
/** Partials of a voice on "oo" to "ah": strong up to the first formant, then falling. */
const voicePartials = [0, 1, 0.72, 0.5, 0.24, 0.12, 0.08, 0.05, 0.02];

/** The sounds of a backing in one audio context. */
export interface BackingSounds {
  /** Renders the strings that a plan needs, one at a time, letting the page breathe between them. */
  prepare(plan: BackingPlan): Promise<void>;
  /** Sounds an event at a time of the context, into a node. A string that was not prepared is rendered now. */
  sound(event: BackingEvent, at: number, duration: number, into: AudioNode): void;
}

export function createBackingSounds(context: BaseAudioContext): BackingSounds {
  const strings = new Map<string, AudioBuffer>();
  const wave = context.createPeriodicWave(new Float32Array(voicePartials.length), Float32Array.from(voicePartials));

  const stringOf = (kind: "guitar" | "bass", midi: number): AudioBuffer => {
    const name = `${kind} ${midi}`;
    const kept = strings.get(name);
    if (kept) return kept;
    const pcm = pluckString(midi, context.sampleRate, kind === "guitar" ? guitar : bass);
    const buffer = context.createBuffer(1, pcm.length, context.sampleRate);
    buffer.copyToChannel(pcm, 0);
    strings.set(name, buffer);
    return buffer;
  };

  const strike = (buffer: AudioBuffer, at: number, end: number, gain: number, into: AudioNode) => {
    const source = new AudioBufferSourceNode(context, { buffer });
    const loud = new GainNode(context, { gain });
    loud.gain.setValueAtTime(gain, Math.max(at, end));
    loud.gain.linearRampToValueAtTime(0, Math.max(at, end) + dampS);
    source.connect(loud).connect(into);
    source.start(at);
    source.stop(Math.max(at, end) + dampS);
  };

  const tone = (hz: number, at: number, end: number, into: AudioNode, shape: (loud: AudioParam) => void) => {
    const source = new OscillatorNode(context, { frequency: hz });
    const loud = new GainNode(context, { gain: 0 });
    shape(loud.gain);
    source.connect(loud).connect(into);
    source.start(at);
    source.stop(end);
    return source;
  };

  const click = (event: BackingEvent, at: number, into: AudioNode) => {
    tone(event.level >= 0.85 ? 1568 : 1175, at, at + clickS + 0.01, into, (gain) => {
      gain.setValueAtTime(gains.click * event.level, at);
      gain.exponentialRampToValueAtTime(0.0005, at + clickS);
    });
  };

  /** A held tone that comes in and goes like a voice, with a slow vibrato on long notes. */
  const guide = (event: BackingEvent, at: number, end: number, into: AudioNode) => {
    const level = gains.guide * event.level;
    const rise = Math.min(0.05, (end - at) / 3);
    const fall = Math.min(0.08, (end - at) / 3);
    const voice = tone(midiToHz(event.midis[0]!), at, end + 0.02, into, (gain) => {
      gain.setValueAtTime(0, at);
      gain.linearRampToValueAtTime(level, at + rise);
      gain.setValueAtTime(level, end - fall);
      gain.linearRampToValueAtTime(0, end);
    });
    voice.setPeriodicWave(wave);
    if (end - at < 0.5) return;
    const swing = new OscillatorNode(context, { frequency: 5.4 });
    const depth = new GainNode(context, { gain: 0 });
    depth.gain.setValueAtTime(0, at + 0.25);
    depth.gain.linearRampToValueAtTime(16, at + 0.6);
    swing.connect(depth).connect(voice.detune);
    swing.start(at);
    swing.stop(end + 0.02);
  };

  const strum = (event: BackingEvent, at: number, end: number, into: AudioNode) => {
    const down = event.kind === "strum-down";
    const order = down ? event.midis : [...event.midis].reverse();
    const gap = down ? strumS.down : strumS.up;
    order.forEach((midi, k) => {
      strike(stringOf("guitar", midi), at + k * gap, end, gains.string * event.level * (down ? 1 : 0.92 ** k), into);
    });
  };

  return {
    async prepare({ events }) {
      for (const { kind, midis } of events) {
        if (kind === "click" || kind === "guide") continue;
        for (const midi of midis) {
          const sort = kind === "bass" ? "bass" : "guitar";
          if (strings.has(`${sort} ${midi}`)) continue;
          stringOf(sort, midi);
          await new Promise((next) => setTimeout(next, 0));
        }
      }
    },
    sound(event, at, duration, into) {
      const end = at + duration;
      if (event.kind === "click") click(event, at, into);
      else if (event.kind === "guide") guide(event, at, end, into);
      else if (event.kind === "bass") {
        strike(stringOf("bass", event.midis[0]!), at, end, gains.bass * event.level, into);
      } else if (event.kind === "pluck") {
        strike(stringOf("guitar", event.midis[0]!), at, end, gains.pluck * event.level, into);
      } else strum(event, at, end, into);
    },
  };
}
