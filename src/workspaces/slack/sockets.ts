import type { SocketModeReceiver } from '@slack/bolt';
import { inWords } from './log.ts';
import type { Logger, Time } from './ports.ts';
import { atMost } from './wait.ts';

const firstPauseMs = 1_000;
const longestPauseMs = 30_000;
const connectLimitMs = 30_000;
const closeLimitMs = 2_000;

/** One connection that is opened anew whenever it is lost. */
export type KeptSocket = {
  /** Resolves at the first connection; rejects where that fails. */
  readonly start: () => Promise<void>;
  readonly stop: () => Promise<void>;
};

/**
 * Keeps one socket connected. The library could do it too, but leaves a failed reconnect as an unhandled rejection, which
 * ends the process; so its own reconnecting has to be off and this stands in for it.
 */
export const keepSocket = (receiver: SocketModeReceiver, time: Time, log: Logger): KeptSocket => {
  const { client } = receiver;
  let stopped = false;
  let endPause = () => {};

  const pause = (failures: number): Promise<void> =>
    new Promise((resolve) => {
      const callOff = time.after(Math.min(firstPauseMs * 2 ** failures, longestPauseMs), resolve);
      endPause = () => {
        callOff();
        resolve();
      };
    });

  const connect = async (): Promise<{ readonly lost: Promise<void> }> => {
    const lost = new Promise<void>((resolve) => {
      client.once('disconnected', () => resolve());
    });
    const giveUp = time.after(connectLimitMs, () => {
      client.disconnect().catch(() => {});
    });
    try {
      await receiver.start();
    } finally {
      giveUp();
    }
    return { lost };
  };

  const keep = async (first: { readonly resolve: () => void; readonly reject: (error: unknown) => void }) => {
    let failures = 0;
    while (!stopped) {
      try {
        const { lost } = await connect();
        first.resolve();
        failures = 0;
        await lost;
      } catch (error) {
        first.reject(error);
        failures += 1;
        if (!stopped) log.warn(`A socket to the platform could not be opened (${inWords(error)}).`);
      }
      if (!stopped) await pause(failures);
    }
  };

  return {
    start: () => new Promise((resolve, reject) => void keep({ resolve, reject })),
    stop: async () => {
      stopped = true;
      endPause();
      await atMost(time, closeLimitMs, client.disconnect());
    },
  };
};
