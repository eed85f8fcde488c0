import type { Time } from './ports.ts';
import { wait } from './wait.ts';

/** `burst` turns at once, then one every `intervalMs`. */
export type PaceRule = { readonly burst: number; readonly intervalMs: number };

/** The platform takes about one message a second in a channel and tolerates short bursts. */
export const messagePace: PaceRule = { burst: 3, intervalMs: 1_000 };

/** It takes about 50 edits a minute in the whole workspace: a burst and a minute's worth together stay below. */
export const editPace: PaceRule = { burst: 5, intervalMs: 1_500 };

type Lane = { tail: Promise<void>; turnsLeft: number; countedMs: number; heldUntilMs: number };

export type Pace = {
  /** Resolves when it is this caller's turn in the lane; callers are served in order. */
  readonly turn: (lane: string) => Promise<void>;
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
    const lane = { tail: Promise.resolve(), turnsLeft: burst, countedMs: time.nowMs(), heldUntilMs: 0 };
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

  const take = async (lane: Lane): Promise<void> => {
    for (let ms = waitMs(lane); ms > 0; ms = waitMs(lane)) await wait(time, ms);
    lane.turnsLeft -= 1;
  };

  return {
    turn: (name) => {
      const lane = laneOf(name);
      lane.tail = lane.tail.then(() => take(lane));
      return lane.tail;
    },
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
