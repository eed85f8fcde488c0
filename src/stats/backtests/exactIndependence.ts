import { logGamma } from '../distributions/gammaFunctions.ts';
import { independenceRatio } from './independence.ts';
import type { Transitions } from './transitions.ts';

const logChoose = (n: number, k: number): number => logGamma(n + 1) - logGamma(k + 1) - logGamma(n - k + 1);

/** One class of arrangements that share their transition counts, and the share of all arrangements that it holds. */
export type ArrangementClass = { readonly transitions: Transitions; readonly share: number };

/**
 * Every way in which x exceedances can lie in T days, gathered by runs: r runs of exceedances need g = r + 1 − f − l
 * runs of quiet days, where f and l say whether the first and the last day are exceedances.
 * Needs 0 < exceedances < days.
 */
export const arrangementClasses = (exceedances: number, days: number): ArrangementClass[] => {
  const quiet = days - exceedances;
  const logAll = logChoose(days, exceedances);
  const classes: ArrangementClass[] = [];
  for (let runs = 1; runs <= Math.min(exceedances, quiet + 1); runs += 1) {
    for (const first of [0, 1]) {
      for (const last of [0, 1]) {
        const quietRuns = runs + 1 - first - last;
        if (quietRuns < 1 || quietRuns > quiet) continue;
        const logWays = logChoose(exceedances - 1, runs - 1) + logChoose(quiet - 1, quietRuns - 1);
        const n11 = exceedances - runs;
        const n01 = runs - first;
        const n10 = runs - last;
        const transitions = { n00: days - 1 - n11 - n01 - n10, n01, n10, n11 };
        classes.push({ transitions, share: Math.exp(logWays - logAll) });
      }
    }
  }
  return classes;
};

/** Ratios of mirrored arrangements differ in their last bits only. */
const ratioTolerance = 1e-9;

/**
 * Given how many exceedances there were, how likely is an arrangement at least as patterned as this one?
 *
 * Convention: every arrangement of x exceedances in T days is equally likely; the shares of all arrangements whose
 * independence ratio reaches the observed one less 1e-9 are added. Both clustering and regular spacing count.
 * Domain: 0 ≤ exceedances ≤ days; the transitions must belong to them.
 * Units: counts in, probability out; exact up to rounding (1e-12).
 * Edges: no exceedance, or nothing else: null, there is nothing to test.
 * Source: the statistic is Christoffersen's (1998); the run counts are Mood 1940, Annals of Mathematical Statistics 11,
 * 367-392, section 2; the enumeration is ours.
 * Example: five exceedances in a row within 250 days: p = 3.15e-8.
 */
export const exactIndependenceP = (
  exceedances: number,
  days: number,
  transitions: Transitions,
): number | null => {
  if (exceedances === 0 || exceedances === days) return null;
  const limit = independenceRatio(transitions) - ratioTolerance;
  let sum = 0;
  for (const { transitions: arranged, share } of arrangementClasses(exceedances, days)) {
    if (independenceRatio(arranged) >= limit) sum += share;
  }
  return Math.min(1, sum);
};
