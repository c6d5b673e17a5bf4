import type { BackingPlan } from "@/shared/songs/backing/backingPlan";
import { type BackingSounds, createBackingSounds } from "./backingSounds";

/** Sound is given to the device this far ahead of its time, in looks this far apart. */
const aheadS = 0.2;
const lookMs = 25;
const lookOfflineS = 0.1;
/** A page that is not seen is looked after once a second only. */
const aheadUnseenS = 2.5;
/** From the press to the first sound, beside what the device takes. */
const leadS = 0.015;
const fadeS = 0.03;
const shortestLoopS = 0.2;
/** A moderate level: a person's voice is heard over it. */
export const MODERATE_LEVEL = 0.6;

/** From where to where a plan is played. Times in seconds of the plan. */
export interface BackingStart {
  /** default the beginning */
  from?: number;
  /** comes back to `at` when it reaches `end` */
  loop?: { at: number; end: number } | null;
  /** counts in before it begins, wherever that is; default yes */
  countIn?: boolean;
}

/** A planned backing that can be heard. */
export interface Backing {
  /** Renders what it sounds with; starting before that is done is possible too. */
  prepare(): Promise<void>;
  /**
   * Starts at once, from the press.
   *
   * @returns time of the context at which the first sound is given to the device
   */
  start(how?: BackingStart): number;
  /** Silences it and keeps the place. */
  pause(): void;
  /** Goes on where it was paused, without counting in. */
  resume(): void;
  stop(): void;
  /** 0 to 1 */
  setLevel(level: number): void;
  /** time of the plan that is heard now; null while it is silent */
  heard(): number | null;
  /** time of the context at which time 0 of the plan was given to the device, or would have been; null while silent */
  beganAt(): number | null;
  /** seconds between giving a sound to the device and hearing it, as the browser tells */
  latencyS(): number;
  close(): void;
}

/** A stretch of the plan with the context's time at which it begins. */
interface Leg {
  at: number;
  end: number;
  contextAt: number;
  /** events before this one were given */
  next: number;
}

/**
 * Plays a plan in an audio context. In an offline context it starts with the context.
 *
 * @param sounds those of this context; plans in several keys share their strings
 * @param onEnded called when the song has ended by itself
 */
export function createBacking(
  plan: BackingPlan,
  context: BaseAudioContext,
  sounds: BackingSounds = createBackingSounds(context),
  onEnded?: () => void,
): Backing {
  const live = context instanceof AudioContext ? context : null;
  const limiter = new DynamicsCompressorNode(context, {
    threshold: -8,
    knee: 4,
    ratio: 20,
    attack: 0.002,
    release: 0.12,
  });
  const level = new GainNode(context, { gain: MODERATE_LEVEL });
  level.connect(limiter).connect(context.destination);
  let run: GainNode | null = null;
  let timer: ReturnType<typeof setInterval> | null = null;
  let legs: Leg[] = [];
  let loop: BackingStart["loop"] = null;
  let pausedAt: number | null = null;
  let beganAt = 0;

  const firstFrom = (time: number) => {
    const index = plan.events.findIndex(({ at }) => at >= time - 1e-6);
    return index < 0 ? plan.events.length : index;
  };
  const addLeg = (at: number, end: number, contextAt: number) => {
    legs.push({ at, end, contextAt, next: firstFrom(at) });
  };
  const latencyS = () => (live ? live.baseLatency + (live.outputLatency || 0) : 0);

  /** Gives everything that begins before a time of the context; true when the song is at its end. */
  const giveUpTo = (until: number): boolean => {
    for (;;) {
      const leg = legs.at(-1)!;
      for (; leg.next < plan.events.length; leg.next += 1) {
        const event = plan.events[leg.next]!;
        if (event.at >= leg.end - 1e-6) break;
        const when = leg.contextAt + event.at - leg.at;
        if (when > until) return false;
        const late = context.currentTime - when;
        if (run && late < 0.1) {
          sounds.sound(event, Math.max(when, 0), Math.min(event.duration, leg.end - event.at), run);
        }
      }
      const endsAt = leg.contextAt + leg.end - leg.at;
      if (loop && endsAt <= until) {
        addLeg(loop.at, loop.end, endsAt);
        legs = legs.slice(-8);
      } else return endsAt <= until;
    }
  };

  const silence = () => {
    if (timer !== null) clearInterval(timer);
    timer = null;
    const ending = run;
    run = null;
    if (!ending) return;
    const now = context.currentTime;
    ending.gain.setValueAtTime(1, now);
    ending.gain.linearRampToValueAtTime(0, now + fadeS);
    // Sounds that were given ahead lead nowhere once their node is let go.
    setTimeout(() => ending.disconnect(), 1000 * fadeS + 50);
  };

  /** An offline context stops at every look, as if the time had come to it. */
  const renderAhead = (from: number) => {
    if (!(context instanceof OfflineAudioContext)) return;
    giveUpTo(from + aheadS);
    for (let at = from + lookOfflineS; at < context.length / context.sampleRate; at += lookOfflineS) {
      void context.suspend(at).then(() => {
        giveUpTo(at + aheadS);
        return context.resume();
      });
    }
  };

  const heard = () => {
    if (!run) return null;
    const now = context.currentTime - latencyS();
    const leg = legs.findLast(({ contextAt }) => contextAt <= now) ?? legs[0];
    return leg ? Math.min(leg.end, Math.max(leg.at, leg.at + now - leg.contextAt)) : null;
  };

  const begin = (from: number, countIn: boolean): number => {
    silence();
    if (live && live.state !== "running") void live.resume().catch(() => undefined);
    run = new GainNode(context, { gain: 1 });
    run.connect(level);
    const contextAt = live ? context.currentTime + leadS : 0;
    const end = loop?.end ?? plan.durationS;
    legs = [];
    if (countIn && from > plan.countInS + 1e-6) {
      const barS = (plan.metre.quarters * 60) / plan.tempo;
      addLeg(plan.countInS - barS, plan.countInS, contextAt);
      giveUpTo(contextAt + barS);
      addLeg(from, end, contextAt + barS);
      beganAt = contextAt + barS - from;
    } else {
      addLeg(from, end, contextAt);
      beganAt = contextAt - from;
    }
    if (!live) renderAhead(contextAt);
    else {
      const look = () => {
        const unseen = typeof document !== "undefined" && document.hidden;
        giveUpTo(context.currentTime + (unseen ? aheadUnseenS : aheadS));
        const last = legs.at(-1)!;
        if (!loop && context.currentTime - latencyS() >= last.contextAt + last.end - last.at) {
          silence();
          onEnded?.();
        }
      };
      timer = setInterval(look, lookMs);
      look();
    }
    return contextAt;
  };

  return {
    prepare: () => sounds.prepare(plan),
    start({ from = 0, loop: round = null, countIn = true } = {}) {
      pausedAt = null;
      loop = live && round && round.end - round.at >= shortestLoopS ? round : null;
      const place = Math.min(plan.durationS, Math.max(0, from));
      return begin(loop && place >= loop.end ? loop.at : place, countIn);
    },
    pause() {
      pausedAt = heard() ?? pausedAt;
      silence();
    },
    resume() {
      if (pausedAt === null) return;
      begin(pausedAt, false);
      pausedAt = null;
    },
    stop() {
      pausedAt = null;
      silence();
    },
    setLevel(value) {
      level.gain.setTargetAtTime(Math.min(1, Math.max(0, value)), context.currentTime, 0.02);
    },
    heard,
    beganAt: () => (run ? beganAt : null),
    latencyS,
    close() {
      silence();
      level.disconnect();
    },
  };
}
