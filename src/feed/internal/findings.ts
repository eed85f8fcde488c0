import type { FeedFinding, FindingExample } from '../../terms/feedReport.ts';
import { type FeedCheckCode, feedChecks, weightOf } from '../checks.ts';

const mostExamples = 5;

/** An example whose value may still have to be fetched from the file. */
export type KeptExample = Omit<FindingExample, 'value'> & { value: string | null };

type Seen = {
  count: number;
  readonly examples: KeptExample[];
  readonly firstOfTicker: Map<string, KeptExample>;
};

/** What the checks of one reading have found so far. */
export type Findings = {
  /** Returns the example where it is kept, so that its value can be filled in later. */
  readonly record: (code: FeedCheckCode, example: Partial<FindingExample>) => KeptExample | null;
  readonly count: (code: FeedCheckCode) => number;
  /** The first place at which a code was seen, for one ticker or at all. */
  readonly first: (code: FeedCheckCode, ticker?: string) => FindingExample | null;
  /** The code for which a ticker is not served, the first by the order of the list; null where it is served. */
  readonly quarantineOf: (ticker: string) => FeedCheckCode | null;
  /** The tickers at which a code was seen. */
  readonly tickersOf: (code: FeedCheckCode) => ReadonlySet<string>;
  readonly quarantinedTickers: () => ReadonlySet<string>;
  readonly list: () => readonly FeedFinding[];
};

const codes = Object.keys(feedChecks).filter((name): name is FeedCheckCode =>
  Object.hasOwn(feedChecks, name),
);
const quarantining = codes.filter((code) => weightOf(code) === 'quarantined');

const nowhere: FindingExample = { file: null, ticker: null, day: null, row: null, value: null };

export const makeFindings = (): Findings => {
  const seenOf = new Map<FeedCheckCode, Seen>();
  const record: Findings['record'] = (code, example) => {
    let seen = seenOf.get(code);
    if (seen === undefined) {
      seen = { count: 0, examples: [], firstOfTicker: new Map() };
      seenOf.set(code, seen);
    }
    seen.count += 1;
    const { ticker } = example;
    const isFirstOfTicker = typeof ticker === 'string' && !seen.firstOfTicker.has(ticker);
    if (seen.examples.length >= mostExamples && !isFirstOfTicker) return null;
    const whole: KeptExample = { ...nowhere, ...example };
    if (seen.examples.length < mostExamples) seen.examples.push(whole);
    if (isFirstOfTicker) seen.firstOfTicker.set(ticker, whole);
    return whole;
  };
  const first: Findings['first'] = (code, ticker) => {
    const seen = seenOf.get(code);
    return (ticker === undefined ? seen?.examples[0] : seen?.firstOfTicker.get(ticker)) ?? null;
  };
  const tickersOf: Findings['tickersOf'] = (code) => new Set(seenOf.get(code)?.firstOfTicker.keys());
  return {
    record,
    first,
    count: (code) => seenOf.get(code)?.count ?? 0,
    quarantineOf: (ticker) => quarantining.find((code) => first(code, ticker) !== null) ?? null,
    tickersOf,
    quarantinedTickers: () => new Set(quarantining.flatMap((code) => [...tickersOf(code)])),
    list: () =>
      codes.flatMap((code) => {
        const seen = seenOf.get(code);
        if (seen === undefined) return [];
        return [{ code, ...feedChecks[code], count: seen.count, examples: seen.examples }];
      }),
  };
};
