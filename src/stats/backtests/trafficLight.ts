import { expectedBeyond, type Level, tailFraction } from '../../terms/level.ts';
import { binomialCdf } from '../distributions/binomial.ts';

export type Zone = 'green' | 'yellow' | 'red';

/** `ourExtension`: the supervisor's table is for 250 days at 99%; elsewhere its probabilities are carried over by us. */
export type TrafficLight = { readonly zone: Zone; readonly ourExtension: boolean };

const yellowFrom = 0.95;
const redFrom = 0.9999;
const supervisoryDays = 250;
const leastExpected = 2.5;

const isSupervisory = (days: number, { digits, places }: Level): boolean =>
  days === supervisoryDays && digits === 99 && places === 2;

/**
 * Into which of the three supervisory zones does the count of exceedances fall?
 *
 * Convention: from P(X ≤ exceedances), X binomial with T and 1 − a: below 0.95 green, below 0.9999 yellow, else red.
 * Domain: 0 ≤ exceedances ≤ days.
 * Units: counts in, a zone out.
 * Edges: no exceedance is always green. Null where fewer than 2.5 exceedances are expected (the count of the published
 * table): the zones would hang on a single day. Away from 250 days at 99% it is marked as our extension.
 * Source: Basel Committee on Banking Supervision, January 1996, "Supervisory framework for the use of backtesting", table 2.
 * Example: 5 exceedances in 250 days at 99% are yellow (P = 0.9588).
 */
export const trafficLight = (exceedances: number, days: number, tailLevel: Level): TrafficLight | null => {
  if (expectedBeyond(days, tailLevel) < leastExpected) return null;
  const ourExtension = !isSupervisory(days, tailLevel);
  const cumulative = binomialCdf(exceedances, days, tailFraction(tailLevel));
  if (cumulative < yellowFrom) return { zone: 'green', ourExtension };
  return { zone: cumulative < redFrom ? 'yellow' : 'red', ourExtension };
};
