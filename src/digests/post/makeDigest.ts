import type { InstantMs } from '../../terms/clock.ts';
import { levelFraction, tailFraction } from '../../terms/level.ts';
import type { ByChance, DigestFigures, DigestLine, DigestPost, Skipped } from '../../terms/scheduledPosts.ts';
import type { Subscription } from '../../terms/subscriptions.ts';
import { windowText } from '../../terms/window.ts';
import type { DigestBody } from '../body.ts';
import type { Calendar, ChanceOfNonGreen, PricesNow } from '../ports.ts';
import { digestLine } from './digestLine.ts';
import { oldPricesOf } from './oldPrices.ts';

export const hasFigures = (line: DigestLine): line is DigestFigures => line.ok;

/** How far a line has moved, in half-widths of its interval; what cannot be told comes after what can, refusals last. */
const moved = (line: DigestLine): number => {
  if (!line.ok) return -2;
  return line.changeOverHalfWidth === null ? -1 : Math.abs(line.changeOverHalfWidth);
};

const largestChangeFirst = (lines: readonly DigestLine[]): readonly DigestLine[] =>
  [...lines].sort((first, second) => moved(second) - moved(first) || (first.ticker < second.ticker ? -1 : 1));

/** Expectations add up, however the tickers hang together. */
const byChanceOf = (
  lines: readonly DigestLine[],
  body: DigestBody,
  chanceOfNonGreen: ChanceOfNonGreen,
): ByChance => {
  const figures = lines.filter(hasFigures);
  const told = figures.filter(({ exceeded }) => exceeded !== null).length;
  const chances = figures.flatMap(({ judged }) =>
    judged === null || judged.zone === null ? [] : (chanceOfNonGreen(judged.days, body.tailLevel) ?? []),
  );
  return {
    exceedances: told * tailFraction(body.tailLevel),
    nonGreenZones: chances.length === 0 ? null : chances.reduce((sum, chance) => sum + chance, 0),
  };
};

/** What a digest is made of beside its subscription. */
export type Making = {
  readonly prices: PricesNow;
  readonly calendar: Calendar;
  readonly chanceOfNonGreen: ChanceOfNonGreen;
  /** VaR of each ticker in the digest before. */
  readonly vars: Readonly<Record<string, number>>;
  readonly skipped: Skipped | null;
  /** When it was due; null where somebody asks now. */
  readonly dueMs: InstantMs | null;
  readonly nowMs: InstantMs;
};

/** The post of a digest: one line per ticker, made from one reading of the feed. */
export const makeDigest = async (
  subscription: Subscription,
  body: DigestBody,
  making: Making,
): Promise<DigestPost> => {
  const { prices, calendar, vars, skipped, dueMs, nowMs, chanceOfNonGreen } = making;
  const lines = await Promise.all(
    body.tickers.map((ticker) => digestLine(prices, body, ticker, vars[ticker], subscription)),
  );
  return {
    kind: 'digest',
    id: subscription.id,
    dueMs,
    timeZone: subscription.schedule?.timeZone ?? 'UTC',
    tailLevel: levelFraction(body.tailLevel),
    confidenceLevel: levelFraction(body.confidence),
    model: body.model,
    window: windowText(body.window),
    oldPrices: oldPricesOf(prices, body.tickers, dueMs ?? nowMs, calendar),
    skipped,
    flags: body.tickers.flatMap((ticker) =>
      (prices.series(ticker)?.flags ?? []).map(({ text }) => `${ticker}: ${text}`),
    ),
    lines: largestChangeFirst(lines),
    byChance: byChanceOf(lines, body, chanceOfNonGreen),
  };
};

/** VaR of each ticker that has one, to be held against the next digest. */
export const varsOf = (
  lines: readonly DigestLine[],
  before: Readonly<Record<string, number>>,
): Readonly<Record<string, number>> => ({
  ...before,
  ...Object.fromEntries(lines.filter(hasFigures).map((line) => [line.ticker, line.var])),
});
