import limits from '../../fixtures/platform/limits.json' with { type: 'json' };
import type { ManualTime } from '../time.ts';

export type Delivery = {
  readonly kind: 'events_api' | 'slash_commands' | 'interactive';
  readonly payload: Record<string, unknown>;
};

/** Hands one attempt over; `answered` gets what the app acknowledged with, or null where it did not. */
export type Transport = (delivery: Delivery, attempt: number, answered: (answer: unknown) => void) => void;

export type Sent = {
  /** How often it was handed over so far. */
  readonly attempts: () => number;
  /** What the app acknowledged with, on whichever attempt; never settles where it never does. */
  readonly acknowledged: Promise<unknown>;
};

/**
 * Events that are not acknowledged in time come again: at once, after one and after five minutes.
 * Commands and presses come once.
 */
export const makeDeliveries = (time: ManualTime, transport: () => Transport) => {
  const retryDelay = (delivery: Delivery, attempt: number): number | undefined =>
    delivery.kind === 'events_api' ? limits.events.retryAfterMs[attempt] : undefined;

  return {
    deliver: (delivery: Delivery): Sent => {
      let attempts = 0;
      let acknowledge: (answer: unknown) => void = () => {};
      const acknowledged = new Promise<unknown>((resolve) => {
        acknowledge = resolve;
      });

      const attempt = () => {
        const number = attempts;
        attempts += 1;
        let settled = false;
        const settle = (answer: unknown) => {
          if (settled) return;
          settled = true;
          callOff();
          const delayMs = retryDelay(delivery, number);
          if (answer !== null) acknowledge(answer);
          else if (delayMs === 0) attempt();
          else if (delayMs !== undefined) time.after(delayMs, attempt);
        };
        const callOff = time.after(limits.events.acknowledgeWithinMs, () => settle(null));
        transport()(delivery, number, settle);
      };

      attempt();
      return { attempts: () => attempts, acknowledged };
    },
  };
};
