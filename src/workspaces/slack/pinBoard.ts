import type { PinOutcome, Wall } from '../pins/ports.ts';
import { makePace, type PaceRule } from './pace.ts';
import type { Time } from './ports.ts';
import { wait } from './wait.ts';
import type { Wire } from './wire.ts';

/** The platform takes about 20 pins a minute in the whole workspace. */
const pinPace: PaceRule = { burst: 3, intervalMs: 3_500 };
const lane = 'pins';
const mostAttempts = 4;
const retryMs = 5_000;

/** Answers that mean the wish is fulfilled already: a pin that is tried again after a lost answer is no second pin. */
const fulfilled: Readonly<Record<string, readonly string[]>> = {
  'pins.add': ['already_pinned'],
  'pins.remove': ['no_pin', 'not_pinned', 'message_not_found'],
};

export type PinBoard = Pick<Wall, 'pin' | 'unpin'>;

/** The platform's own pins. */
export const makePinBoard = (wire: Wire, time: Time): PinBoard => {
  const pace = makePace(time, pinPace);

  const persist = async (method: string, channel: string, timestamp: string): Promise<PinOutcome> => {
    for (let attempt = 0; attempt < mostAttempts; attempt += 1) {
      await pace.turn(lane);
      const outcome = await wire.call(method, { channel, timestamp });
      if (outcome.kind === 'done') return { kind: 'done' };
      if (outcome.kind === 'refused')
        return fulfilled[method]?.includes(outcome.code) === true
          ? { kind: 'done' }
          : { kind: 'refused', code: outcome.code };
      if (outcome.kind === 'limited') pace.hold(lane, outcome.retryAfterMs);
      else await wait(time, retryMs);
    }
    return { kind: 'unreached' };
  };

  return {
    pin: (channel, ts) => persist('pins.add', channel, ts),
    unpin: (channel, ts) => persist('pins.remove', channel, ts),
  };
};
