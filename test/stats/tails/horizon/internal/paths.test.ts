import { describe, expect, test } from 'vitest';
import { nextNormal } from '../../../../../src/stats/random/draws.ts';
import { filterSource } from '../../../../../src/stats/tails/filtered/internal/filterSource.ts';
import { moneyFractionOf, pathLossOf } from '../../../../../src/stats/tails/horizon/internal/compounding.ts';
import { filteredHorizon } from '../../../../../src/stats/tails/horizon/internal/filteredPaths.ts';
import {
  monteCarloErrors,
  simulatedFigures,
} from '../../../../../src/stats/tails/horizon/internal/simulatedFigures.ts';
import { simulateLosses } from '../../../../../src/stats/tails/horizon/internal/simulatePaths.ts';
import { accepted } from '../../../../laws/outcomes.ts';
import { relativeError } from '../../../../laws/relativeError.ts';
import { level } from '../../../levels.ts';
import { testStreams } from '../../../testStreams.ts';
import { simulateGarchReturns } from '../../../volatility/simulateReturns.ts';

describe('the loss of a path', () => {
  const path = Float64Array.of(0.1, -0.2, 0.05);

  test('of simple returns compounds, of log returns adds, by hand', () => {
    expect(relativeError(pathLossOf('simple', 'long')(path), 1 - 1.1 * 0.8 * 1.05)).toBeLessThan(1e-14);
    expect(relativeError(pathLossOf('simple', 'short')(path), 0.9 * 1.2 * 0.95 - 1)).toBeLessThan(1e-14);
    expect(relativeError(pathLossOf('log', 'long')(path), 0.05)).toBeLessThan(1e-14);
  });

  test('is whole once the price is gone, whatever follows', () => {
    expect(pathLossOf('simple', 'long')(Float64Array.of(-1.5, -3, 9))).toBe(1);
    expect(pathLossOf('simple', 'short')(Float64Array.of(0.5, 1.2))).toBe(-1);
    expect(pathLossOf('simple', 'short')(Float64Array.of(-1e300, -1e300, 2))).toBe(-1);
  });

  test('in money, by hand', () => {
    expect(relativeError(moneyFractionOf('log', 'long')(0.1), 1 - Math.exp(-0.1))).toBeLessThan(1e-14);
    expect(relativeError(moneyFractionOf('log', 'short')(0.1), Math.exp(0.1) - 1)).toBeLessThan(1e-14);
    expect(moneyFractionOf('simple', 'short')(0.1)).toBe(0.1);
  });
});

describe('the error of the simulation', () => {
  test('is the scatter of repeated simulations', () => {
    const tailLevel = level('0.95');
    const streams = testStreams(65);
    const runs = Array.from({ length: 200 }, (_, run) => {
      const losses = simulateLosses(
        (random, into) => {
          into[0] = nextNormal(random);
        },
        pathLossOf('log', 'long'),
        1,
        2_000,
        { stream: (block) => streams.stream(100 * run + block) },
      ).sort();
      const figures = simulatedFigures(losses, tailLevel);
      return { figures, errors: monteCarloErrors(losses, tailLevel, figures) };
    });
    const scatter = (of: (run: (typeof runs)[number]) => number): { mean: number; deviation: number } => {
      const values = runs.map(of);
      const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
      const squares = values.reduce((sum, value) => sum + (value - mean) ** 2, 0);
      return { mean, deviation: Math.sqrt(squares / (values.length - 1)) };
    };
    // The deviation of 200 runs is known to 5%; three times that, and the bias of the rank spacing.
    const varError = scatter(({ errors }) => errors.var).mean;
    expect(relativeError(varError, scatter(({ figures }) => figures.var).deviation)).toBeLessThan(0.15);
    const esError = scatter(({ errors }) => errors.es).mean;
    expect(relativeError(esError, scatter(({ figures }) => figures.es).deviation)).toBeLessThan(0.15);
    // √(0.95·0.05/2000)/φ(1.645), φ(1.645) = 0.1031 (by hand).
    expect(relativeError(varError, Math.sqrt((0.95 * 0.05) / 2000) / 0.1031)).toBeLessThan(0.05);
  });
});

describe('filtered paths', () => {
  test.each(['ewma', 'garch'] as const)('%s: the variance moves on as its recursion says', (kind) => {
    const calm = simulateGarchReturns(600, { mu: 0.0005, omega: 1e-5, alpha: 0.15, beta: 0.75 }, 8, 66);
    // A restless end, from which the variance has a way to fall.
    const returns = calm.map((value, day) => (day < 596 ? value : 4 * value));
    const { process, residuals, nextVariance } = accepted(filterSource(returns, kind)).state;
    const meanSquare = residuals.reduce((sum, residual) => sum + residual ** 2, 0) / residuals.length;
    const { paths } = accepted(filteredHorizon(returns, kind));
    const streams = testStreams(67);
    const squares = new Float64Array(20);
    const path = new Float64Array(20);
    const random = streams.stream(0);
    for (let count = 0; count < 40_000; count += 1) {
      paths(random, path);
      path.forEach((value, day) => {
        squares[day] = (squares[day] as number) + (value - process.mu) ** 2 / 40_000;
      });
    }
    if (kind === 'garch') expect(squares[19]).toBeLessThan(0.8 * (squares[0] as number));
    let variance = nextVariance;
    squares.forEach((found) => {
      // A mean of 40,000 squares of fat-tailed returns: a standard error near 1.5%.
      expect(relativeError(found, meanSquare * variance)).toBeLessThan(0.06);
      variance = process.omega + (process.alpha * meanSquare + process.beta) * variance;
    });
  });
});
