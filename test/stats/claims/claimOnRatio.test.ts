import { describe, expect, test } from 'vitest';
import { claimOnRatio, type RatioClaim } from '../../../src/stats/claims/claimOnRatio.ts';
import { accepted, refusalCode, refusalMessage } from '../../laws/outcomes.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { indexReturns } from '../indexWindows.ts';
import { level, level95 } from '../levels.ts';

const dax = indexReturns('DAX', '60');

const ask = (more: Partial<RatioClaim> = {}) =>
  claimOnRatio({
    returns: dax,
    claimed: 0.15,
    level: level95,
    side: 'both',
    smallestMeanThatMatters: 0.0005,
    ...more,
  });

// SciPy 1.17.1, scipy.stats.nct with 59 degrees of freedom and brentq (xtol 1e-14); nct is good to about 1e-10.
const tolerance = 1e-8;

describe('DAX over 60 days, ratio -0.00634 a day, against 0.15', () => {
  const claim = accepted(ask());

  test('t, p and interval', () => {
    expect(relativeError(claim.t, -0.04908906995947487)).toBeLessThan(tolerance);
    expect(relativeError(claim.p, 0.22598578555449614)).toBeLessThan(tolerance);
    expect(relativeError(claim.lower ?? 0, -0.2593434119773508)).toBeLessThan(tolerance);
    expect(relativeError(claim.upper ?? 0, 0.24672225792754335)).toBeLessThan(tolerance);
    expect(claim.verdict).toBe('cannot tell');
  });

  test('reach: the nearer of the two ratios that are found with 80% power', () => {
    // 0.3770 above, 0.3627 below.
    expect(relativeError(claim.detectableAt80, 0.3626718790910444)).toBeLessThan(tolerance);
    expect(relativeError(accepted(ask({ claimed: 0.15 })).returnsNeeded ?? 0, 351)).toBe(0);
  });

  test('reach of a one-sided claim, on the side that is looked at alone', () => {
    // brentq on nct.sf(nct.ppf(0.95, 59, 60**.5*0.15), 59, 60**.5*(0.15 + d)) - 0.8; below with ppf(0.05) and cdf.
    expect(relativeError(accepted(ask({ side: 'above' })).detectableAt80, 0.3319384914342866)).toBeLessThan(
      tolerance,
    );
    expect(relativeError(accepted(ask({ side: 'below' })).detectableAt80, 0.3213227691081578)).toBeLessThan(
      tolerance,
    );
  });

  test('the mirrored claim has the same reach, found on the other side', () => {
    // Exact by symmetry; the root is found to a few units in the last place of the noncentral t, 1e-12.
    const mirrored = accepted(ask({ claimed: -0.15 }));
    expect(relativeError(mirrored.detectableAt80, claim.detectableAt80)).toBeLessThan(1e-12);
  });

  test('a level of 10% rejects so often that nothing has to be found', () => {
    expect(accepted(ask({ level: level('0.1') })).detectableAt80).toBe(0);
  });

  test('one-sided: the end at 95% alone', () => {
    const above = accepted(ask({ side: 'above' }));
    expect(relativeError(above.lower ?? 0, -0.21866242592807703)).toBeLessThan(tolerance);
    expect(above.upper).toBeNull();
    expect(relativeError(above.p, 1 - 0.11299289277724807)).toBeLessThan(tolerance);
    const below = accepted(ask({ side: 'below' }));
    expect(relativeError(below.p, 0.11299289277724807)).toBeLessThan(tolerance);
    expect(below.lower).toBeNull();
  });
});

describe('verdicts and edges', () => {
  test('outside the interval is contradicted', () => {
    expect(accepted(ask({ claimed: 0.25 })).verdict).toBe('contradicted');
    expect(accepted(ask({ claimed: -0.26 })).verdict).toBe('contradicted');
  });

  test('a claim of zero is measured by the mean that matters', () => {
    // The half-width 0.253 is 33.6 bp of mean at s = 1.326%.
    const claim = accepted(ask({ claimed: 0 }));
    expect(claim.verdict).toBe('cannot tell');
    expect(claim.returnsNeeded).toBeNull();
    expect(accepted(ask({ claimed: 0, smallestMeanThatMatters: 0.0034 })).verdict).toBe('consistent');
  });

  test('a one-sided level of 50% excludes nothing', () => {
    const refused = ask({ side: 'above', level: level('0.5') });
    expect(refusalCode(refused)).toBe('levelOutside');
    expect(refusalMessage(refused)).toMatch(/^A one-sided claim on a ratio at 50% /);
  });

  test('too few, or still', () => {
    expect(refusalCode(ask({ returns: [0.01] }))).toBe('tooFewReturns');
    expect(refusalCode(ask({ returns: [0.01, 0.01] }))).toBe('priceDoesNotMove');
    expect(refusalMessage(ask({ returns: [0.01] }))).toMatch(
      /^A claim on the ratio of mean to deviation needs /,
    );
  });
});
