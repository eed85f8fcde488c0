import type { CoverageProcess } from '../../src/stats/coverage/cell.ts';
import { nextNormal, nextOpenDouble } from '../../src/stats/random/draws.ts';
import type { Random } from '../../src/terms/random.ts';

/** One simulated history, and what the day after it holds. */
export type Path = {
  readonly returns: Float64Array;
  readonly nextReturn: number;
  /** The standard deviation of the next return, given the history. */
  readonly nextDeviation: number;
};

/** Every process has this mean and (stationary) standard deviation: an ordinary share, day by day. */
export const trueMean = 0.0005;
export const trueDeviation = 0.01;

/** A path of `count` returns from a stream; standardised inside, so that the truths are the two figures above. */
export type Process = (random: Random, count: number) => Path;

const sumOfSquaredNormals = (random: Random, count: number): number => {
  let sum = 0;
  for (let index = 0; index < count; index += 1) sum += nextNormal(random) ** 2;
  return sum;
};

/** Student's t with a whole number of degrees of freedom above 2, scaled to unit variance. */
const nextUnitStudent = (random: Random, degreesOfFreedom: number): number =>
  nextNormal(random) * Math.sqrt((degreesOfFreedom - 2) / sumOfSquaredNormals(random, degreesOfFreedom));

const independent =
  (nextUnit: (random: Random) => number): Process =>
  (random, count) => ({
    returns: Float64Array.from({ length: count }, () => trueMean + trueDeviation * nextUnit(random)),
    nextReturn: trueMean + trueDeviation * nextUnit(random),
    nextDeviation: trueDeviation,
  });

const keep = 0.3;

const autoregressive: Process = (random, count) => {
  // The first value is drawn from the stationary distribution, so no run-in is needed.
  let unit = nextNormal(random);
  const innovation = Math.sqrt(1 - keep ** 2);
  const next = (): number => {
    const now = unit;
    unit = keep * unit + innovation * nextNormal(random);
    return trueMean + trueDeviation * now;
  };
  return {
    returns: Float64Array.from({ length: count }, next),
    nextReturn: next(),
    nextDeviation: trueDeviation * innovation,
  };
};

export const garch = { alpha: 0.08, beta: 0.9, degreesOfFreedom: 5 } as const;
/** Shocks to the variance fade with 0.98 a day: after 500 days four parts in 100,000 are left. */
const runIn = 500;

const garchT: Process = (random, count) => {
  const { alpha, beta, degreesOfFreedom } = garch;
  let variance = 1;
  const next = (): number => {
    const unit = Math.sqrt(variance) * nextUnitStudent(random, degreesOfFreedom);
    variance = 1 - alpha - beta + alpha * unit ** 2 + beta * variance;
    return trueMean + trueDeviation * unit;
  };
  for (let day = 0; day < runIn; day += 1) next();
  const returns = Float64Array.from({ length: count }, next);
  const nextDeviation = trueDeviation * Math.sqrt(variance);
  return { returns, nextReturn: next(), nextDeviation };
};

export const processes: Readonly<Record<CoverageProcess, Process>> = {
  normal: independent(nextNormal),
  studentT4: independent((random) => nextUnitStudent(random, 4)),
  studentT3: independent((random) => nextUnitStudent(random, 3)),
  exponential: independent((random) => -Math.log(nextOpenDouble(random)) - 1),
  autoregressive,
  garchT,
};
