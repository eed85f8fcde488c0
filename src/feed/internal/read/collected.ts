import type { FileReport } from '../../../terms/feedReport.ts';
import { type Findings, makeFindings } from '../findings.ts';
import { makeRowStore, type RowStore } from '../rowStore.ts';

/** What the optional columns say of one ticker, gathered over all its rows. */
export type TickerExtras = {
  readonly ticker: string;
  currency: string | null;
  daysWithoutVolume: number;
  lastDay: number;
  lastClose: number;
};

/** Rows gathered from one price file after the other. */
export type Collected = RowStore & {
  readonly names: string[];
  /** The number of a ticker, a new one at its first sight. */
  readonly numberOf: (ticker: string) => number;
  /** What the optional columns say of a ticker so far; null for a number that no ticker has. */
  readonly extrasOf: (tickerNumber: number) => TickerExtras | null;
  readonly findings: Findings;
};

/** The rows of all files, and a report on each file. */
export type ReadFiles = { readonly files: readonly FileReport[]; readonly collected: Collected };

export const makeCollected = (): Collected => {
  const names: string[] = [];
  const numbers = new Map<string, number>();
  const numberOf = (ticker: string): number => {
    const known = numbers.get(ticker);
    if (known !== undefined) return known;
    numbers.set(ticker, names.length);
    names.push(ticker);
    return names.length - 1;
  };
  const extras: TickerExtras[] = [];
  const extrasOf = (number: number): TickerExtras | null => {
    const ticker = names[number];
    if (ticker === undefined) return null;
    extras[number] ??= {
      ticker,
      currency: null,
      daysWithoutVolume: 0,
      lastDay: Number.NEGATIVE_INFINITY,
      lastClose: 0,
    };
    return extras[number];
  };
  return { names, numberOf, ...makeRowStore(), extrasOf, findings: makeFindings() };
};

const mostTickerLength = 40;

/** A quotation mark that was left open swallows whole rows into a name; such a name is refused, not served. */
export const isTickerName = (name: string): boolean =>
  name.length <= mostTickerLength && !/[\p{Cc}\p{Zl}\p{Zp}\uFFFD]/u.test(name);

/** Stands for a row without a ticker. */
export const noTicker = -1;
/** Stands for a ticker whose name cannot be one. */
export const wrongName = -2;

/** The number of the ticker that a cell names, or what stands for none. */
export const numberOfCell = (text: string, { numberOf }: Collected): number => {
  // spaces alone, as everywhere else: a control character beside a name is a fault to be told
  const name = text.replace(/^ +| +$/g, '');
  if (name === '') return noTicker;
  return isTickerName(name) ? numberOf(name) : wrongName;
};
