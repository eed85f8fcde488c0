import { describe, expect, it } from 'vitest';
import { normalTail } from '../../../src/stats/tails/normalTail.ts';
import { accepted, refusalCode } from '../../laws/outcomes.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { indexReturns } from '../indexWindows.ts';
import { level } from '../levels.ts';
import { testStreams } from '../testStreams.ts';

const ask = (returns: Float64Array, tailLevel = '0.99', confidence = '0.95') =>
  normalTail({
    returns,
    tailLevel: level(tailLevel),
    confidence: level(confidence),
    streams: testStreams(3),
  });

/** As many returns as asked, half up and half down. */
const upAndDown = (count: number): Float64Array =>
  Float64Array.from({ length: count }, (_, index) => (index % 2 === 0 ? 0.01 : -0.01));

describe('The normal tail', () => {
  it('asks for 20 returns that differ', () => {
    expect(refusalCode(ask(upAndDown(19)))).toBe('tooFewReturns');
    expect(ask(upAndDown(19))).toMatchObject({ problem: { needs: 20 } });
    expect(refusalCode(ask(new Float64Array(20)))).toBe('priceDoesNotMove');
    expect(refusalCode(ask(upAndDown(20)))).toBe('not refused');
  });

  it('has the exact interval of VaR', () => {
    // SciPy 1.17.1: −mean + s/√n·scipy.stats.nct.ppf(p, n − 1, √n·norm.ppf(0.99)), p = 0.025 and 0.975, on the last
    // returns of DAX. SciPy itself is good to about 1e-12 there.
    const known = [
      { window: '250', lower: 0.029559721743204856, upper: 0.0366463270878211 },
      { window: 'all', lower: 0.022336791234033954, upper: 0.024138052615271337 },
    ] as const;
    for (const { window, lower, upper } of known) {
      const { varInterval, varIntervalMethod, varAttainedLevel } = accepted(ask(indexReturns('DAX', window)));
      expect(relativeError(varInterval?.lower ?? Number.NaN, lower)).toBeLessThan(1e-11);
      expect(relativeError(varInterval?.upper ?? Number.NaN, upper)).toBeLessThan(1e-11);
      expect(varIntervalMethod).toBe('noncentralT');
      expect(varAttainedLevel).toBeNull();
    }
  });

  it('has the exact interval of ES', () => {
    // SciPy 1.17.1, as above with the ES multiplier in the place of the quantile: k = norm.pdf(norm.ppf(0.99))/0.01.
    const known = [
      { window: '250', lower: 0.03420576258047724, upper: 0.04206131346404035 },
      { window: 'all', lower: 0.025726687445515338, upper: 0.02772299220301851 },
    ] as const;
    for (const { window, lower, upper } of known) {
      const { esInterval, esIntervalMethod } = accepted(ask(indexReturns('DAX', window)));
      expect(relativeError(esInterval?.lower ?? Number.NaN, lower)).toBeLessThan(1e-11);
      expect(relativeError(esInterval?.upper ?? Number.NaN, upper)).toBeLessThan(1e-11);
      expect(esIntervalMethod).toBe('noncentralT');
    }
  });

  it('has both intervals at a confidence that no resampling reaches', () => {
    const figures = accepted(ask(upAndDown(40), '0.99', '0.99999'));
    expect(figures.esInterval?.lower).toBeLessThan(figures.es ?? Number.NaN);
    expect(figures.esInterval?.upper).toBeGreaterThan(figures.es ?? Number.NaN);
    expect(figures.notes).toEqual([]);
  });
});
