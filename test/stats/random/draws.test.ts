import { describe, expect, it } from 'vitest';
import { chiSquareUpperTail } from '../../../src/stats/distributions/chiSquare.ts';
import { normalCdf } from '../../../src/stats/distributions/normal.ts';
import { nextDouble, nextIndex, nextNormal, nextOpenDouble } from '../../../src/stats/random/draws.ts';
import { createStreams } from '../../../src/stats/random/xoshiro128.ts';
import type { Random } from '../../../src/terms/random.ts';

const streams = createStreams(new Uint8Array(32).fill(11));

/** A source that draws what it is told, then fails. */
const scripted = (...draws: readonly number[]): Random => {
  const rest = [...draws];
  return {
    nextUint32: () => {
      const next = rest.shift();
      if (next === undefined) throw new Error('no draws left');
      return next;
    },
  };
};

/** p of the chi-square test that draws from 0 to cells − 1 are equally likely. */
const uniformityP = (cells: number, count: number, draw: (index: number) => number): number => {
  const seen = new Array<number>(cells).fill(0);
  for (let index = 0; index < count; index += 1) {
    const cell = draw(index);
    seen[cell] = (seen[cell] ?? Number.NaN) + 1;
  }
  const expected = count / cells;
  const statistic = seen.reduce((sum, observed) => sum + (observed - expected) ** 2 / expected, 0);
  return chiSquareUpperTail(statistic, cells - 1);
};

// Seeds are fixed, so these p values never change; a sound generator has them inside these bounds 998 times in 1000.
const believable = (p: number): void => {
  expect(p).toBeGreaterThan(1e-3);
  expect(p).toBeLessThan(1 - 1e-3);
};

describe('doubles', () => {
  it('take 27 bits of one draw and 26 of the next', () => {
    expect(nextDouble(scripted(0, 0))).toBe(0);
    expect(nextDouble(scripted(31, 63))).toBe(0);
    expect(nextDouble(scripted(32, 0))).toBe(2 ** -27);
    expect(nextDouble(scripted(0, 64))).toBe(2 ** -53);
    expect(nextDouble(scripted(0xffffffff, 0xffffffff))).toBe(1 - 2 ** -53);
  });

  it('inside (0, 1) draw again instead of giving 0', () => {
    expect(nextOpenDouble(scripted(0, 0, 1, 1, 0x80000000, 0))).toBe(0.5);
  });

  it('are uniform within a stream and across streams', () => {
    const random = streams.stream(0);
    believable(uniformityP(1000, 200_000, () => Math.floor(1000 * nextDouble(random))));
    believable(
      uniformityP(1000, 200_000, (replicate) => Math.floor(1000 * nextDouble(streams.stream(replicate)))),
    );
  });

  it('of neighbouring streams are unrelated', () => {
    // pairs (first of stream r, first of stream r + 1) fill a 20 by 20 grid evenly
    const first = (replicate: number): number => Math.floor(20 * nextDouble(streams.stream(replicate)));
    believable(uniformityP(400, 100_000, (pair) => 20 * first(2 * pair) + first(2 * pair + 1)));
  });
});

describe('indices', () => {
  it('are the upper half of draw × count', () => {
    expect(nextIndex(scripted(0xffffffff), 60)).toBe(59);
    expect(nextIndex(scripted(0x80000001), 60)).toBe(30);
    expect(nextIndex(scripted(123456789), 1)).toBe(0);
    expect(nextIndex(scripted(0xffffffff), 2 ** 21)).toBe(2 ** 21 - 1);
  });

  it('draw again where keeping the draw would favour an index', () => {
    // 2^32 mod 60 = 16: draws whose product leaves less than 16 in its lower half are one too many; 0 and 2^31 leave 0
    expect(nextIndex(scripted(0, 0x80000000, 0x80000001), 60)).toBe(30);
    // product leaves 60 or more: kept
    expect(nextIndex(scripted(1), 60)).toBe(0);
  });

  it('give every index exactly the same number of draws', () => {
    // 2^32 = 3·1431655765 + 1: of all draws exactly one, 0, is refused
    const kept = [0, 1, 2].map((cell) => {
      const from = Math.ceil((cell * 2 ** 32) / 3);
      const to = Math.ceil(((cell + 1) * 2 ** 32) / 3);
      expect(nextIndex(scripted(from, 0x80000001), 3), `first draw of ${cell}`).toBe(cell === 0 ? 1 : cell);
      expect(nextIndex(scripted(to - 1), 3), `last draw of ${cell}`).toBe(cell);
      return to - from - (cell === 0 ? 1 : 0);
    });
    expect(new Set(kept).size).toBe(1);
  });

  it.each([2, 60, 1000])('are uniform over %d', (count) => {
    const random = streams.stream(count);
    believable(uniformityP(count, 200_000, () => nextIndex(random, count)));
  });

  it('throw on a count that is none', () => {
    for (const count of [0, -1, 1.5, Number.NaN, 2 ** 21 + 1, 2 ** 32 + 5]) {
      expect(() => nextIndex(streams.stream(0), count), String(count)).toThrow(
        /^nextIndex: count .* is not a whole number from 1/,
      );
    }
  });
});

describe('normals', () => {
  it('have the normal distribution', () => {
    const random = streams.stream(5);
    believable(uniformityP(500, 200_000, () => Math.floor(500 * normalCdf(nextNormal(random)))));
  });

  it('are the quantile of one open double', () => {
    expect(nextNormal(scripted(0x80000000, 0))).toBe(0);
  });
});
