import { bench, describe } from 'vitest';
import { nextStudentT } from '../../src/stats/random/studentDraw.ts';
import { createStreams } from '../../src/stats/random/xoshiro128.ts';
import { studentDistanceProbability } from '../../src/stats/tails/internal/studentDistance.ts';
import { fitStudent } from '../../src/stats/tails/studentFit.ts';
import { studentTail } from '../../src/stats/tails/studentTail.ts';
import { levelFromPercent } from '../../src/terms/level.ts';

const streams = createStreams(new Uint8Array(32).fill(1));
const sample = (stream: number, count: number): Float64Array => {
  const random = streams.stream(stream);
  return Float64Array.from({ length: count }, () => 0.01 * nextStudentT(random, 4));
};

const rolling = sample(1, 251);
const [yesterday, today] = [rolling.slice(0, 250), rolling.slice(1)];
const fitted = fitStudent(yesterday);
const near = fitted.ok ? fitted.value : { location: 0, scale: 0.01, nu: 4 };
const halfThousand = sample(2, 500);
const tailLevel = levelFromPercent('99');
const confidence = levelFromPercent('95');
if (tailLevel === null || confidence === null) throw new Error('the levels of the benchmark are not levels');

// Goals on one core of a 2-core container of 2024, Node 20, after warming up.
describe('Student fit', () => {
  // goal: under 0.25 ms (measured 0.08 to 0.12 ms)
  bench('250 returns, no start given', () => {
    fitStudent(today);
  });

  // goal: under 0.08 ms (measured 0.04 ms)
  bench('250 returns, from the fit of the day before', () => {
    fitStudent(today, near);
  });

  // goal: under 20 ms (measured 1 to 2 ms)
  bench('500 returns: fit and profile intervals of nu, VaR and ES', () => {
    studentTail({ returns: halfThousand, tailLevel, confidence, streams });
  });

  // goal: under 400 ms (measured 190 ms)
  bench(
    '500 returns: Anderson-Darling p with 999 refits',
    () => {
      studentDistanceProbability(0.5, 500, 4, streams);
    },
    { iterations: 3, time: 0, warmupIterations: 1, warmupTime: 0 },
  );
});
