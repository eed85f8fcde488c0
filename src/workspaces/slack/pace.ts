import type { Time } from './ports.ts';
import { wait } from './wait.ts';

/** `burst` turns at once, then one every `intervalMs`. */
export type PaceRule = { readonly burst: number; readonly intervalMs: number };

/** The platform takes about one message a second in a channel and tolerates short bursts. */
export const messagePace: PaceRule = { burst: 3, intervalMs: 1_000 };

/** It takes about 50 edits a minute in the whole workspace: a burst and a minute's worth together stay below. */
export const editPace: PaceRule = { burst: 5, intervalMs: 1_500 };

type Waiting = { readonly urgent: boolean; readonly go: () => void };
type Lane = {
  readonly queue: Waiting[];
  serving: boolean;
  turnsLeft: number;
  countedMs: number;
  heldUntilMs: number;
};

export type Pace = {
  /** Resolves when it is this caller's turn in the lane; those for whom a person waits go first, then in order. */
  readonly turn: (lane: string, urgent?: boolean) => Promise<void>;
  /** Takes a turn only where one is free at once. */
  readonly tryTurn: (lane: string) => boolean;
  /** Nobody's turn before this much time has passed: the platform said so. */
  readonly hold: (lane: string, forMs: number) => void;
};

export const makePace = (time: Time, { burst, intervalMs }: PaceRule): Pace => {
  const lanes = new Map<string, Lane>();

  const laneOf = (name: string): Lane => {
    const known = lanes.get(name);
    if (known !== undefined) return known;
    const lane = { queue: [], serving: false, turnsLeft: burst, countedMs: time.nowMs(), heldUntilMs: 0 };
    lanes.set(name, lane);
    return lane;
  };

  const count = (lane: Lane): void => {
    const earned = (time.nowMs() - lane.countedMs) / intervalMs;
    lane.turnsLeft = Math.min(burst, lane.turnsLeft + earned);
    lane.countedMs = time.nowMs();
  };

  const waitMs = (lane: Lane): number => {
    count(lane);
    const heldMs = lane.heldUntilMs - time.nowMs();
    if (heldMs > 0) return heldMs;
    return lane.turnsLeft >= 1 ? 0 : Math.ceil((1 - lane.turnsLeft) * intervalMs);
  };

  const nextIn = ({ queue }: Lane): Waiting | undefined => {
    const urgent = queue.findIndex((waiting) => waiting.urgent);
    return queue.splice(Math.max(urgent, 0), 1)[0];
  };

  /** Who is next is decided when the turn comes, not when the waiting begins. */
  const serve = async (lane: Lane): Promise<void> => {
    if (lane.serving) return;
    lane.serving = true;
    while (lane.queue.length > 0) {
      for (let ms = waitMs(lane); ms > 0; ms = waitMs(lane)) await wait(time, ms);
      lane.turnsLeft -= 1;
      nextIn(lane)?.go();
    }
    lane.serving = false;
  };

  return {
    turn: (name, urgent = false) =>
      new Promise((go) => {
        const lane = laneOf(name);
        lane.queue.push({ urgent, go });
        void serve(lane);
      }),
    tryTurn: (name) => {
      const lane = laneOf(name);
      if (waitMs(lane) > 0) return false;
      lane.turnsLeft -= 1;
      return true;
    },
    hold: (name, forMs) => {
      const lane = laneOf(name);
      lane.heldUntilMs = Math.max(lane.heldUntilMs, time.nowMs() + forMs);
    },
  };
};
