import type { Deliveries } from '../deliveries.ts';
import type { Destination } from './deliver.ts';
import { placeholderKey } from './keys.ts';
import { inWords } from './log.ts';
import type { Logger, Time } from './ports.ts';
import type { At, Voice } from './post.ts';

const waitMs = 1_500;
const progressMs = 5_000;
/** A sign of life that comes later than this is none: whoever takes the answer over says something better. */
const lifeMs = 15_000;
const standing = 'Working on it.';

/** A sign of life where an answer takes long. */
export type Placeholder = {
  /** Says how far the answer has come; shown no more often than every five seconds. */
  readonly progress: (words: string) => void;
  /** Ends it: nothing is posted or changed any more. The message that stands there, if any. */
  readonly end: () => Promise<At | null>;
};

export type PlaceholderDesk = {
  readonly voice: Voice;
  readonly deliveries: Deliveries;
  readonly time: Time;
  readonly log: Logger;
};

/** A placeholder that an earlier try has left: it says nothing more until it is ended. */
export const leftStanding = (at: At): Placeholder => ({ progress: () => {}, end: async () => at });

export const startPlaceholder = (
  { voice, deliveries, time, log }: PlaceholderDesk,
  to: Destination & { readonly eventKey: string; readonly team: string },
): Placeholder => {
  let words = standing;
  let shown: { readonly words: string; readonly sinceMs: number; readonly at: At } | null = null;
  let ended = false;
  /** Planned or on its way: never two at a time, so that they cannot overtake each other. */
  let busy = false;
  let underWay: Promise<void> = Promise.resolve();
  let callOff = () => {};

  const act = async (show: (said: string) => Promise<At | null>): Promise<void> => {
    const said = words;
    try {
      const at = await show(said);
      if (at !== null) shown = { words: said, sinceMs: time.nowMs(), at };
    } catch (error) {
      log.error(`A placeholder failed: ${inWords(error)}`);
    }
    busy = false;
    catchUp();
  };

  const later = (delayMs: number, show: (said: string) => Promise<At | null>): void => {
    busy = true;
    callOff = time.after(delayMs, () => {
      underWay = act(show);
    });
  };

  /** Plans the next edit where there is something new to say. */
  const catchUp = (): void => {
    if (ended || busy || shown === null || words === shown.words) return;
    const { at, sinceMs } = shown;
    later(Math.max(0, sinceMs + progressMs - time.nowMs()), async (said) => {
      await voice.updateNow(at, { text: said, blocks: [] });
      return at;
    });
  };

  later(waitMs, async (said) => {
    const { team, channel, threadTs, eventKey } = to;
    const outcome = await deliveries.say({
      key: placeholderKey(eventKey),
      team,
      channel,
      threadTs,
      content: { text: said, blocks: [] },
      urgent: true,
      expiresAtMs: time.nowMs() + lifeMs,
    });
    return outcome.kind === 'said' ? { channel, ts: outcome.ts } : null;
  });

  return {
    progress: (said) => {
      words = `${standing} ${said}`;
      catchUp();
    },
    end: async () => {
      ended = true;
      callOff();
      // What is still on its way would overwrite the answer, or stand beside it for good.
      await underWay;
      return shown?.at ?? null;
    },
  };
};
