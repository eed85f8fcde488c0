import { describe, expect, test } from 'vitest';
import { nextNormal } from '../../../../../src/stats/random/draws.ts';
import { nextStudentT } from '../../../../../src/stats/random/studentDraw.ts';
import { filteredHorizon } from '../../../../../src/stats/tails/horizon/internal/filteredPaths.ts';
import { normalHorizon } from '../../../../../src/stats/tails/horizon/internal/normalPaths.ts';
import { peaksHorizon } from '../../../../../src/stats/tails/horizon/internal/peaksPaths.ts';
import { studentHorizon } from '../../../../../src/stats/tails/horizon/internal/studentPaths.ts';
import { accepted, refusalCode } from '../../../../laws/outcomes.ts';
import { testStreams } from '../../../testStreams.ts';

const streams = testStreams(68);

describe('days from their formulas, by the same random numbers', () => {
  test('normal: mean + deviation·z, and the pivots s·√((n−1)/χ²) and mean − σ·z/√n', () => {
    const model = normalHorizon(5, { mean: 0.001, sampleStandardDeviation: 0.02 });
    const path = new Float64Array(2);
    model.paths(streams.stream(1), path);
    const plain = streams.stream(1);
    expect([...path]).toEqual([0.001 + 0.02 * nextNormal(plain), 0.001 + 0.02 * nextNormal(plain)]);

    const drawing = streams.stream(2);
    let squares = 0;
    for (let degree = 0; degree < 4; degree += 1) squares += nextNormal(drawing) ** 2;
    const deviation = 0.02 * Math.sqrt(4 / squares);
    const mean = 0.001 - (deviation * nextNormal(drawing)) / Math.sqrt(5);
    model.redraw(streams.stream(2))?.(streams.stream(3), path);
    expect(path[0]).toBe(mean + deviation * nextNormal(streams.stream(3)));
  });

  test('student: location + scale·t, whose mean exists above nu 1', () => {
    const parameters = { location: 0.001, scale: 0.01, nu: 3 };
    const path = new Float64Array(1);
    studentHorizon(60, parameters).paths(streams.stream(4), path);
    expect(path[0]).toBe(0.001 + 0.01 * nextStudentT(streams.stream(4), 3));
    expect([1, 1.01].map((nu) => studentHorizon(60, { ...parameters, nu }).lossHasMean)).toEqual([
      false,
      true,
    ]);
  });
});

describe('days of the largest losses', () => {
  const random = streams.stream(5);
  const returns = Float64Array.from({ length: 1_000 }, () => 0.01 * nextStudentT(random, 4));
  const parameters = {
    threshold: 0,
    exceedances: 100,
    shape: 0.2,
    shapeInterval: { lower: 0, upper: 0.5 },
    scale: 0.01,
  };
  const model = accepted(peaksHorizon(returns, parameters));
  /** The 900th of 1,000 ascending losses is the threshold. */
  const threshold = [...returns].map((value) => -value).sort((a, b) => a - b)[899] as number;
  const path = new Float64Array(2_000);
  const shareBeyond = (): number => path.filter((value) => -value > threshold).length / path.length;

  test('lie beyond the threshold one time in ten, on the side of losses', () => {
    model.paths(streams.stream(6), path);
    // Four standard errors of a share of 10% in 2,000.
    expect(Math.abs(shareBeyond() - 0.1)).toBeLessThan(4 * Math.sqrt(0.09 / 2_000));
  });

  test('still do so over 30 draws of the parameters', () => {
    let sum = 0;
    for (let draw = 0; draw < 30; draw += 1) {
      model.redraw(streams.stream(100 + draw))?.(streams.stream(200 + draw), path);
      sum += shareBeyond();
    }
    // One draw scatters by √(0.09/1000 + 0.09/2000) = 0.0116; four standard errors of the mean of 30 are 0.0085.
    expect(Math.abs(sum / 30 - 0.1)).toBeLessThan(0.0085);
  });

  test('have a mean below xi = 1', () => {
    const hasMean = (shape: number) => accepted(peaksHorizon(returns, { ...parameters, shape })).lossHasMean;
    expect([0.99, 1, 1.2].map(hasMean)).toEqual([true, false, false]);
  });

  test('are refused where the fit is, as filtered ones are', () => {
    expect(refusalCode(peaksHorizon(returns.slice(0, 249), parameters))).toBe('tooFewReturns');
    expect(refusalCode(filteredHorizon(returns.slice(0, 60), 'garch'))).toBe('tooFewReturns');
  });
});
