import { describe, expect, it } from 'vitest';
import { binomialCdf, binomialUpperTail } from '../../../src/stats/distributions/binomial.ts';
import { nextStudentT } from '../../../src/stats/random/studentDraw.ts';
import { historicalTail } from '../../../src/stats/tails/historicalTail.ts';
import { resampledShortfall } from '../../../src/stats/tails/internal/historicalEsInterval.ts';
import { boundingRanks } from '../../../src/stats/tails/internal/rankInterval.ts';
import { accepted, refusalCode } from '../../laws/outcomes.ts';
import { indexReturns } from '../indexWindows.ts';
import { level } from '../levels.ts';
import { testStreams } from '../testStreams.ts';

const streams = testStreams(2);
const ask = (returns: Float64Array, tailLevel: string, confidence = '0.95') =>
  historicalTail({ returns, tailLevel: level(tailLevel), confidence: level(confidence), streams });

/** Losses 1, 2, … count hundredths of a percent, in a mixed order. */
const ladder = (count: number): Float64Array =>
  Float64Array.from({ length: count }, (_, index) => -(1 + ((index * 7) % count)) / 10_000);

describe('Historical VaR and ES', () => {
  it('are the 95th of 100 losses and the mean of the five above it', () => {
    const figures = accepted(ask(ladder(100), '0.95'));
    expect(figures.var).toBeCloseTo(0.0095, 15);
    expect(figures.es).toBeCloseTo(0.0098, 15); // (96 + … + 100)/5
    expect(figures.parameters.rank).toBe(95);
  });

  it('count the loss at the rank with the share that is left over', () => {
    // n·a = 48.75 of 50, so k = 49: ES = [l(50) + 0.25·l(49)]/1.25
    const figures = accepted(ask(ladder(50), '0.975'));
    expect(figures.var).toBeCloseTo(0.0049, 15);
    expect(figures.es).toBeCloseTo((0.005 + 0.25 * 0.0049) / 1.25, 15);
  });

  it('need as many returns as leave one beyond the level', () => {
    expect(refusalCode(ask(ladder(99), '0.99'))).toBe('notEnoughTail');
    expect(ask(ladder(99), '0.99')).toMatchObject({ problem: { needs: 100 } });
    expect(refusalCode(ask(ladder(100), '0.99'))).toBe('not refused');
    expect(ask(ladder(39), '0.975')).toMatchObject({ problem: { needs: 40 } });
  });

  it('are refused for a price that does not move', () => {
    expect(refusalCode(ask(new Float64Array(100), '0.95'))).toBe('priceDoesNotMove');
  });

  it('may be gains, written as negative losses', () => {
    const figures = accepted(
      ask(
        ladder(40).map((value) => -value),
        '0.95',
      ),
    );
    expect(figures.var).toBeLessThan(0);
    expect(figures.es).toBeLessThan(0);
  });
});

describe('The rank interval of a historical VaR', () => {
  // SciPy 1.17.1: scipy.stats.binom.cdf and sf, ranks searched one by one.
  const known = [
    { count: 250, order: 0.95, lower: 230, upper: 245, attained: 0.9720578543551132 },
    { count: 500, order: 0.99, lower: 490, upper: 500, attained: 0.9801859498578059 },
    { count: 1859, order: 0.99, lower: 1832, upper: 1849, attained: 0.9537252929470748 },
    { count: 367, order: 0.99, lower: 359, upper: null, attained: 0.9873807468697264 },
    { count: 368, order: 0.99, lower: 360, upper: 368, attained: 0.9624158204108587 },
    { count: 100, order: 0.5, lower: 40, upper: 61, attained: 0.9647997997822952 },
  ] as const;

  for (const { count, order, lower, upper, attained } of known)
    it(`has ranks ${lower} and ${upper} for ${count} returns at ${order}`, () => {
      const ranks = boundingRanks(count, order, 0.025);
      expect(ranks).toMatchObject({ lower, upper });
      // SciPy and we differ in the last digits of a binomial sum
      expect(Math.abs(ranks.attained - attained)).toBeLessThan(1e-12);
    });

  it('agrees with its definition, searched over all ranks', () => {
    for (const count of [1, 2, 5, 20, 61])
      for (const order of [0.5, 0.9, 0.99])
        for (const beyond of [0.005, 0.05, 0.3, 0.45]) {
          const ranks = Array.from({ length: count }, (_, index) => index + 1);
          const lower = ranks.filter((rank) => binomialCdf(rank - 1, count, order) <= beyond).at(-1) ?? null;
          const upper = ranks.find((rank) => binomialUpperTail(rank, count, order) <= beyond) ?? null;
          expect(boundingRanks(count, order, beyond)).toMatchObject({ lower, upper });
        }
  });

  it('says how many returns would bound it from above: 72 at 95%, 146 at 97.5%, 368 at 99%', () => {
    for (const [tailLevel, enough, tooFew] of [
      ['0.95', 72, 71],
      ['0.975', 146, 145],
      ['0.99', 368, 367],
    ] as const) {
      const short = accepted(ask(ladder(tooFew), tailLevel));
      expect(short.varInterval?.upper).toBeNull();
      expect(short.varInterval?.lower).not.toBeNull();
      expect(short.notes).toContainEqual(
        expect.objectContaining({ figure: 'varInterval', code: 'upperEndUnbounded', needs: enough }),
      );
      const full = accepted(ask(ladder(enough), tailLevel));
      expect(full.varInterval?.upper).not.toBeNull();
      expect(full.notes.some(({ code }) => code === 'upperEndUnbounded')).toBe(false);
    }
  });

  it('has no lower end either where the smallest loss says too little', () => {
    const figures = accepted(ask(ladder(4), '0.5'));
    expect(figures.varInterval).toEqual({ lower: null, upper: null });
    // 0.5^n ≤ 0.025 from n = 6 on, at both ends
    expect(figures.notes.filter(({ figure }) => figure === 'varInterval').map(({ needs }) => needs)).toEqual([
      6, 6,
    ]);
  });
});

describe('The bootstrap interval of a historical ES', () => {
  it('is made from ten returns beyond the level on average, and names the count below', () => {
    const short = accepted(ask(ladder(199), '0.95'));
    expect(short.esInterval).toBeNull();
    expect(short.esIntervalMethod).toBeNull();
    expect(short.notes).toContainEqual(
      expect.objectContaining({ figure: 'esInterval', code: 'tooFewBeyond', needs: 200 }),
    );
    const figures = accepted(ask(ladder(200), '0.95'));
    expect(figures.esIntervalMethod).toBe('percentileBootstrap');
    expect(figures.esInterval?.lower).toBeLessThan(figures.es ?? Number.NaN);
    expect(figures.esInterval?.upper).toBeGreaterThan(figures.es ?? Number.NaN);
  });

  it('agrees with a bootstrap made elsewhere on DAX, 250 returns at 95%', () => {
    const figures = accepted(ask(indexReturns('DAX', '250'), '0.95'));
    // NumPy 2.4.6, default_rng(1), 200,000 resamples, ES of each by the same definition, quantiles 0.025 and 0.975.
    // Ends from 9,999 of them scatter with a standard deviation of 6e-5 and 1e-4; four of each are granted.
    expect(Math.abs((figures.esInterval?.lower ?? Number.NaN) - 0.02642849)).toBeLessThan(2.4e-4);
    expect(Math.abs((figures.esInterval?.upper ?? Number.NaN) - 0.03817302)).toBeLessThan(4e-4);
  });

  it('is the same for the same streams and widens with the confidence', () => {
    const random = streams.stream(99);
    const returns = Float64Array.from({ length: 300 }, () => 0.01 * nextStudentT(random, 4));
    const once = accepted(ask(returns, '0.95'));
    expect(accepted(ask(returns, '0.95'))).toEqual(once);
    const wider = accepted(ask(returns, '0.95', '0.99'));
    expect(wider.esInterval?.lower).toBeLessThan(once.esInterval?.lower ?? Number.NaN);
    expect(wider.esInterval?.upper).toBeGreaterThan(once.esInterval?.upper ?? Number.NaN);
  });

  it('is left out with a note where the confidence is beyond the resamples', () => {
    const figures = accepted(ask(ladder(300), '0.95', '0.99999'));
    expect(figures.esInterval).toBeNull();
    expect(figures.notes.some(({ code }) => code === 'levelBeyondResamples')).toBe(true);
  });
});

describe('The shortfall of a resample drawn from the largest down', () => {
  it('has the mean that picks one by one would have', () => {
    // SciPy 1.17.1: the j-th largest of 30 picks stands at or below place i with probability binom.sf(30 − j, 30, i/30); the
    // mean of Σ over the places with losses i², the 4.5 largest of 30.
    const losses = Float64Array.from({ length: 30 }, (_, index) => (index + 1) ** 2);
    const shortfallOf = resampledShortfall(losses, 4.5);
    const draws = 20_000;
    let sum = 0;
    for (let draw = 0; draw < draws; draw += 1) sum += shortfallOf(streams.stream(draw));
    // One resample has a standard deviation of 67.7 (NumPy 2.4.6, 200,000 of them); four standard errors of the mean.
    expect(Math.abs(sum / draws - 776.3140611765658)).toBeLessThan((4 * 67.7) / Math.sqrt(draws));
  });

  it('is the mean of all where all are expected, counted as often as they are picked', () => {
    const shortfallOf = resampledShortfall(Float64Array.of(3, 3, 3), 3);
    for (let draw = 0; draw < 20; draw += 1) expect(shortfallOf(streams.stream(draw))).toBe(3);
  });
});
