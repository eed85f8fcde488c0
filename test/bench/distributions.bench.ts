import { bench, describe } from 'vitest';
import { chiSquareQuantile } from '../../src/stats/distributions/chiSquare.ts';
import { logGammaDifference } from '../../src/stats/distributions/gammaFunctions.ts';
import { noncentralityAt, noncentralTUpperTail } from '../../src/stats/distributions/noncentralT.ts';
import { normalQuantile, normalUpperTail } from '../../src/stats/distributions/normal.ts';
import { studentTCdf, studentTDensity, studentTQuantile } from '../../src/stats/distributions/studentT.ts';
import { nextIndex, nextNormal } from '../../src/stats/random/draws.ts';
import { createStreams } from '../../src/stats/random/xoshiro128.ts';

/** The sum keeps the engine from leaving the calls out. */
const sink = { total: 0 };

/** A bench of a thousand calls: the figure printed in ms per run is µs per call. */
const thousand = (name: string, call: (share: number) => number): void =>
  bench(`${name}, 1000 calls`, () => {
    for (let index = 0; index < 1000; index += 1) sink.total += call((index + 0.5) / 1000);
  });

describe('in the inner loops of fits: studentTCdf under 1 µs, normalQuantile under 0.1 µs', () => {
  thousand('normalUpperTail', (share) => normalUpperTail(10 * share));
  thousand('normalQuantile', (share) => normalQuantile(share));
  thousand('studentTCdf, nu 4', (share) => studentTCdf(10 * share - 5, 4));
  thousand('studentTCdf, nu 60', (share) => studentTCdf(10 * share - 5, 60));
  thousand('studentTDensity, nu 4', (share) => studentTDensity(10 * share - 5, 4));
  thousand('logGammaDifference', (share) => logGammaDifference(2 + 60 * share).value);
});

describe('once a figure', () => {
  thousand('studentTQuantile, nu 4', (share) => studentTQuantile(share, 4));
  thousand('chiSquareQuantile, df 59', (share) => chiSquareQuantile(share, 59));
  thousand('noncentralTUpperTail', (share) => noncentralTUpperTail(2.1, 59, 4 * share));
  thousand('noncentralityAt', (share) => noncentralityAt(share, 2.1, 59));
});

const streams = createStreams(new Uint8Array(32).fill(7));
const returns = Float64Array.from({ length: 60 }, (_, index) => index - 29.5);

describe('draws', () => {
  // a bootstrap has 10 ms in all; its 600,000 indices should take less than 8 of them
  bench('means of 9,999 resamples of 60', () => {
    for (let replicate = 0; replicate < 9999; replicate += 1) {
      const random = streams.stream(replicate);
      let sum = 0;
      for (let draw = 0; draw < 60; draw += 1) sum += returns[nextIndex(random, 60)] as number;
      sink.total += sum;
    }
  });
  const random = streams.stream(0);
  thousand('nextIndex of 60', () => nextIndex(random, 60));
  thousand('nextNormal', () => nextNormal(random));
});
