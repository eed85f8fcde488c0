import type { Clock } from '../../terms/clock.ts';
import type { Posted } from './answer.ts';

/** Up to this long after it was asked, a changed question gets a new reply. */
export const editWindowMs = 600_000;

export type Asked = {
  readonly words: string;
  /** The replies that stand below it, once they do. */
  readonly replies: Promise<readonly Posted[]>;
};

/** Questions that can still be edited to some effect, by the key of their message. */
export type AskedQuestions = {
  /** What the message asked before the event that is dealt with now. */
  readonly recall: (messageKey: string, eventKey: string) => Promise<Asked | null>;
  readonly remember: (key: string, asked: Asked) => void;
};

export const askedInMemory = (clock: Clock): AskedQuestions => {
  const known = new Map<string, { readonly asked: Asked; readonly sinceMs: number }>();

  const forgetOld = () => {
    for (const [key, { sinceMs }] of known) {
      if (clock.nowMs() - sinceMs <= 2 * editWindowMs) return;
      known.delete(key);
    }
  };

  return {
    recall: async (key) => known.get(key)?.asked ?? null,
    remember: (key, asked) => {
      forgetOld();
      known.delete(key);
      known.set(key, { asked, sinceMs: clock.nowMs() });
    },
  };
};
