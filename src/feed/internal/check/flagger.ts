import type { Day } from '../../../terms/day.ts';
import type { PriceFlag } from '../../../terms/prices.ts';
import type { FeedCheckCode } from '../../checks.ts';
import type { Findings } from '../findings.ts';

/** Gathers the flags of one ticker and records each as a finding. */
export type Flagger = {
  readonly raise: (code: FeedCheckCode, day: Day | null, text: string, value?: string) => void;
  readonly flags: () => readonly PriceFlag[];
};

/** A ticker that is wrong throughout is known by its latest flags; a list of thousands helps nobody. */
const mostFlagsPerCode = 20;

const latest = (flags: readonly PriceFlag[]): readonly PriceFlag[] => {
  const more = flags.length - mostFlagsPerCode;
  if (more <= 0) return flags;
  const kept = flags.slice(more);
  const [oldest, ...rest] = kept;
  if (oldest === undefined) return kept;
  return [{ ...oldest, text: `${oldest.text} (and ${more} more before)` }, ...rest];
};

export const makeFlagger = (ticker: string, findings: Findings): Flagger => {
  const byCode = new Map<FeedCheckCode, PriceFlag[]>();
  return {
    raise: (code, day, text, value) => {
      findings.record(code, { ticker, day, value: value ?? null });
      const flags = byCode.get(code);
      const flag = { code, text, day };
      if (flags === undefined) byCode.set(code, [flag]);
      else flags.push(flag);
    },
    flags: () => [...byCode.values()].flatMap(latest),
  };
};
