import { describe, expect, it } from 'vitest';
import { noncentralTQuantile } from '../../../src/stats/distributions/noncentralT.ts';
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

  it('has an interval of ES that scatters around the exact one', () => {
    // −mean + k·s is a normal quantile for any k, so the noncentral t gives the interval that 999 resamples approach.
    const returns = indexReturns('DAX', '250');
    const figures = accepted(ask(returns));
    const { mean, sampleStandardDeviation: s } = figures.parameters;
    const multiplier = ((figures.es ?? Number.NaN) + mean) / s;
    const root = Math.sqrt(250);
    const exact = (p: number) => -mean + (s / root) * noncentralTQuantile(p, 249, multiplier * root);
    const width = exact(0.975) - exact(0.025);
    // The 25th of 999 order statistics of a bell curve scatters by √(p(1−p)/B)/density: 2.1% of this width; four granted.
    expect(Math.abs((figures.esInterval?.lower ?? Number.NaN) - exact(0.025))).toBeLessThan(0.085 * width);
    expect(Math.abs((figures.esInterval?.upper ?? Number.NaN) - exact(0.975))).toBeLessThan(0.085 * width);
    expect(figures.esIntervalMethod).toBe('parametricBootstrap');
  });

  it('leaves the interval of ES out where 999 resamples cannot reach the confidence', () => {
    const figures = accepted(ask(upAndDown(40), '0.99', '0.999'));
    expect(figures.esInterval).toBeNull();
    expect(figures.esIntervalMethod).toBeNull();
    expect(figures.notes).toContainEqual(
      expect.objectContaining({ figure: 'esInterval', code: 'levelBeyondResamples' }),
    );
    expect(figures.varInterval).not.toBeNull();
  });
});
