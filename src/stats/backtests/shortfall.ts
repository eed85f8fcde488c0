import { expectedBeyond, type Level, tailFraction } from '../../terms/level.ts';
import type { Random, RandomStreams } from '../../terms/random.ts';
import { nextOpenDouble } from '../random/draws.ts';

/**
 * One figure a day: losses and forecasts on the same days, all as decimal fractions. ES is Infinity on a day whose forecast
 * tail has no mean.
 */
export type JudgedDays = {
  readonly losses: Float64Array;
  readonly valuesAtRisk: Float64Array;
  readonly expectedShortfalls: Float64Array;
};

/** Only a positive and finite ES can be compared with losses in shares of it. */
export const canJudgeShortfall = (expectedShortfalls: Float64Array): boolean =>
  expectedShortfalls.every((expectedShortfall) => expectedShortfall > 0 && expectedShortfall < Infinity);

/**
 * Were the losses beyond VaR as frequent and as large as the ES said?
 *
 * Convention: Z2 = 1 − Σ l·1{l > VaR}/(T·(1 − a)·ES); 0 is expected of a right model, negative is worse than promised.
 * Domain: at least one day.
 * Units: decimal fractions in, a number without unit out.
 * Edges: without an exceedance it is 1. Null if an ES is 0 or less, or infinite: the share of it that was lost has no meaning.
 * Source: Acerbi & Szekely 2014, Risk, December, test 2.
 * Example: on 100 days at 99% one loss of 0.05 beyond a VaR of 0.03 with ES 0.04 gives −0.25.
 */
export const shortfallZ2 = (days: JudgedDays, tailLevel: Level): number | null => {
  const { losses, valuesAtRisk, expectedShortfalls } = days;
  if (!canJudgeShortfall(expectedShortfalls)) return null;
  let sum = 0;
  for (let day = 0; day < losses.length; day += 1) {
    const loss = losses[day] as number;
    if (loss > (valuesAtRisk[day] as number)) sum += loss / (expectedShortfalls[day] as number);
  }
  return 1 - sum / expectedBeyond(losses.length, tailLevel);
};

/** A loss drawn from the forecast of judged day `day`, given that it lies beyond that day's VaR. */
export type DrawBeyond = (day: number, random: Random) => number;

/**
 * How often would Z2 be as low as this, were every day's forecast right?
 *
 * Convention: (1 + #{Z2* ≤ Z2})/(N + 1) over N replicates. In each, every day is a hit with chance 1 − a, independently,
 * so that the hits are Bin(T, 1 − a); a hit's loss is drawn from that day's own forecast beyond its VaR.
 * Domain: every ES positive and finite; N ≥ 1 replicates, 9,999 unless said.
 * Units: decimal fractions in, a probability out.
 * Edges: the smallest possible value is 1/(N + 1).
 * Source: Acerbi & Szekely 2014, Risk, December, on simulating the test; the (1 + count)/(N + 1) form is Davison &
 * Hinkley 1997, Bootstrap Methods and their Application, section 4.2.
 * Example: an observed Z2 of −0.70 at 97.5% on 250 days of normal forecasts has p = 0.05.
 */
export const simulatedShortfallP = (
  observedZ2: number,
  expectedShortfalls: Float64Array,
  tailLevel: Level,
  drawBeyond: DrawBeyond,
  streams: RandomStreams,
  replicates = 9999,
): number => {
  const expected = expectedBeyond(expectedShortfalls.length, tailLevel);
  const logQuiet = Math.log1p(-tailFraction(tailLevel));
  let asLow = 0;
  for (let replicate = 0; replicate < replicates; replicate += 1) {
    const random = streams.stream(replicate);
    const lost = simulatedShares(expectedShortfalls, logQuiet, drawBeyond, random);
    if (1 - lost / expected <= observedZ2) asLow += 1;
  }
  return (1 + asLow) / (replicates + 1);
};

/** Σ of loss over ES on one replicate's hits. Quiet stretches are geometric, so only the hits cost a draw. */
const simulatedShares = (
  expectedShortfalls: Float64Array,
  logQuiet: number,
  drawBeyond: DrawBeyond,
  random: Random,
): number => {
  let sum = 0;
  let day = quietDays(random, logQuiet);
  while (day < expectedShortfalls.length) {
    sum += drawBeyond(day, random) / (expectedShortfalls[day] as number);
    day += 1 + quietDays(random, logQuiet);
  }
  return sum;
};

const quietDays = (random: Random, logQuiet: number): number =>
  Math.floor(Math.log(nextOpenDouble(random)) / logQuiet);
