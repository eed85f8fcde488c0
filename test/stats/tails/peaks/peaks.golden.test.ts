import { describe, expect, test } from 'vitest';
import { quantileBeyond, shortfallBeyond } from '../../../../src/stats/tails/peaks/internal/gpdTail.ts';
import { peaksBeyond } from '../../../../src/stats/tails/peaks/peaksBeyond.ts';
import { fitGpd } from '../../../../src/stats/tails/peaks/peaksFit.ts';
import { peaksTail } from '../../../../src/stats/tails/peaks/peaksTail.ts';
import { accepted } from '../../../laws/outcomes.ts';
import { relativeError } from '../../../laws/relativeError.ts';
import { level, level95 } from '../../levels.ts';
import { fixtureJson, fixtureText } from '../../readFixture.ts';
import { testStreams } from '../../testStreams.ts';

const fireLosses = fixtureText('danish-fire-losses.csv')
  .trim()
  .split('\n')
  .slice(1)
  .map((line) => Number(line.split(',')[1]));

type ParetoCase = {
  readonly threshold: number;
  readonly observations: number;
  readonly exceedances: number;
  readonly xi: number;
  readonly beta: number;
  readonly log_likelihood: number;
  readonly standard_errors_observed_information: { readonly xi: number; readonly beta: number };
  readonly risk_measures_million_dkk: readonly {
    readonly level: number;
    readonly var: number;
    readonly es: number;
  }[];
};

const cases = fixtureJson<{ cases: { name: string; recomputed?: ParetoCase[] }[] }>(
  'risk-worked-examples.json',
).cases.flatMap(({ name, recomputed }) =>
  name === 'danish_fire_generalized_pareto' ? (recomputed ?? []) : [],
);

// McNeil 1997, ASTIN Bulletin 27, recomputed with mpmath 1.2.1 by Newton's method on the score to 1e-25.
describe.each(cases)('Danish fire losses above $threshold million kroner', (expected) => {
  const excesses = Float64Array.from(
    fireLosses.filter((loss) => loss > expected.threshold).map((loss) => loss - expected.threshold),
  );
  const fit = accepted(fitGpd(excesses));

  test('the losses are the ones of the source', () => {
    expect(fireLosses).toHaveLength(expected.observations);
    expect(excesses).toHaveLength(expected.exceedances);
  });

  // The stopping rule leaves 1e-8 standard errors, and the errors are under half of the values.
  test('xi and β with their errors, and the log-likelihood', () => {
    expect(relativeError(fit.shape, expected.xi)).toBeLessThan(1e-8);
    expect(relativeError(fit.scale, expected.beta)).toBeLessThan(1e-8);
    expect(
      relativeError(fit.standardErrors.shape, expected.standard_errors_observed_information.xi),
    ).toBeLessThan(1e-8);
    expect(
      relativeError(fit.standardErrors.scale, expected.standard_errors_observed_information.beta),
    ).toBeLessThan(1e-8);
    expect(relativeError(fit.logLikelihood, expected.log_likelihood)).toBeLessThan(1e-13);
  });

  test.each(expected.risk_measures_million_dkk)('VaR and ES at $level', (figures) => {
    const share = expected.exceedances / expected.observations;
    const depth = Math.log(share / (1 - figures.level));
    // 1 − level in floating point, as in the source of the figures, costs up to 1e-12 of the tail.
    const valueAtRisk = expected.threshold + fit.scale * quantileBeyond(fit.shape, depth);
    const shortfall = expected.threshold + fit.scale * shortfallBeyond(fit.shape, depth);
    expect(relativeError(valueAtRisk, figures.var)).toBeLessThan(3e-8);
    expect(relativeError(shortfall, figures.es)).toBeLessThan(3e-8);
  });
});

test('both thresholds of the source are tested', () => expect(cases).toHaveLength(2));

// scipy 1.17.1, minimize(method='Nelder-Mead', xatol=1e-11) restarted three times for the fit and for each profile in
// (xi, ln ζ) with β from the figure, and optimize.brentq for the ends; on the 216 largest of the 2,167 losses. A search by
// values places a maximum to about 1e-7.
describe('the tenth of the fire losses that is largest', () => {
  const returns = Float64Array.from(fireLosses, (loss) => -loss);
  const input = { returns, tailLevel: level('0.99'), confidence: level95, streams: testStreams(1) };
  const figures = accepted(peaksTail(input));
  const { parameters } = figures;

  test.each([
    ['xi', parameters.shape, 0.5832798982812418],
    ['lower end of xi', parameters.shapeInterval.lower, 0.38100532602135917],
    ['upper end of xi', parameters.shapeInterval.upper, 0.8461653715098392],
    ['β', parameters.scale, 4.521840979163851],
    ['VaR', figures.var, 27.450688192466185],
    ['lower end of VaR', figures.varInterval?.lower, 22.569585626305766],
    ['upper end of VaR', figures.varInterval?.upper, 35.55459911280213],
    ['ES', figures.es, 68.93951281888349],
    ['lower end of ES', figures.esInterval?.lower, 43.479778967433354],
    ['upper end of ES', figures.esInterval?.upper, 210.87803430972116],
  ] as const)('%s', (_, found, expected) => {
    expect(relativeError(found ?? Number.NaN, expected)).toBeLessThan(2e-7);
  });

  test('the threshold and the count beyond it', () => {
    expect(parameters.threshold).toBe(5.561735261);
    expect(parameters.exceedances).toBe(216);
  });

  test('the chance of a loss of 50 million', () => {
    const chance = accepted(
      peaksBeyond({ returns, threshold: 50, confidence: level95, streams: testStreams(1) }),
    );
    expect(relativeError(chance.probability, 0.0037911478840650867)).toBeLessThan(2e-7);
    expect(relativeError(chance.interval?.lower ?? Number.NaN, 0.002041652012336994)).toBeLessThan(2e-7);
    expect(relativeError(chance.interval?.upper ?? Number.NaN, 0.006493451160340734)).toBeLessThan(2e-7);
    expect(chance.intervalMethod).toBe('profileLikelihood');
  });
});
