import { describe, expect, test } from 'vitest';
import { independentDraw, type ResampleDraw, stationaryDraw } from '../../../src/stats/bootstrap/draws.ts';
import { chiSquareUpperTail } from '../../../src/stats/distributions/chiSquare.ts';
import { testStreams } from '../testStreams.ts';

/** How often each index came in `rounds` fillings of an array of `length` picks. */
const counted = (draw: ResampleDraw, length: number, rounds: number): Float64Array => {
  const seen = new Float64Array(draw.count);
  const picks = new Uint32Array(length);
  for (let round = 0; round < rounds; round += 1) {
    draw.fill(testStreams(1).stream(round), picks);
    for (const index of picks) seen[index] = (seen[index] ?? Number.NaN) + 1;
  }
  return seen;
};

/** Probability of counts at least as uneven as these if every index is equally likely. */
const evenness = (seen: Float64Array, total: number): number => {
  const expected = total / seen.length;
  const statistic = seen.reduce((sum, count) => sum + (count - expected) ** 2 / expected, 0);
  return chiSquareUpperTail(statistic, seen.length - 1);
};

// The seed is fixed, so these do not flicker; 0.001 leaves room for a seed that was not chosen.
const plausible = 0.001;

describe('independentDraw', () => {
  test.each([
    [7, 7],
    [60, 60],
    [61, 61],
    [20_000, 300],
  ])('%i values, %i picks: every index equally often', (count, length) => {
    const seen = counted(independentDraw(count), length, 2_000);
    expect(seen.every(Number.isFinite)).toBe(true);
    expect(evenness(seen, length * 2_000)).toBeGreaterThan(plausible);
  });

  test('one value is picked every time', () => {
    const picks = new Uint32Array(3).fill(9);
    independentDraw(1).fill(testStreams(1).stream(0), picks);
    expect([...picks]).toEqual([0, 0, 0]);
  });

  test('words left over by the cells are rejected', () => {
    // 2^32 mod 3,600 = 1,696 words are left over, so the largest word is one of them; the next one, 0, is not.
    const words = [2 ** 32 - 1, 0];
    const picks = new Uint32Array(2).fill(9);
    independentDraw(60).fill({ nextUint32: () => words.shift() ?? 0 }, picks);
    expect([...picks]).toEqual([0, 0]);
  });

  test('neighbouring picks share a word and nothing else', () => {
    const pairs = new Float64Array(49);
    const picks = new Uint32Array(2);
    for (let round = 0; round < 20_000; round += 1) {
      independentDraw(7).fill(testStreams(2).stream(round), picks);
      const cell = (picks[0] ?? 0) * 7 + (picks[1] ?? 0);
      pairs[cell] = (pairs[cell] ?? Number.NaN) + 1;
    }
    expect(evenness(pairs, 20_000)).toBeGreaterThan(plausible);
  });
});

describe('stationaryDraw', () => {
  test.each([1, 1.5, 4, 12.3])('blocks of %f: every index equally often', (blockLength) => {
    // Only the first pick of each filling, since the others depend on it; then the last one.
    for (const place of [0, 9]) {
      const seen = new Float64Array(10);
      const picks = new Uint32Array(10);
      for (let round = 0; round < 5_000; round += 1) {
        stationaryDraw(10, blockLength).fill(testStreams(3).stream(round), picks);
        const index = picks[place] ?? 0;
        seen[index] = (seen[index] ?? Number.NaN) + 1;
      }
      expect(evenness(seen, 5_000)).toBeGreaterThan(plausible);
    }
  });

  test.each([1.5, 4, 12.3])('blocks of %f are that long on average', (blockLength) => {
    const draw = stationaryDraw(1_000, blockLength);
    const picks = new Uint32Array(1_000);
    let starts = 0;
    for (let round = 0; round < 200; round += 1) {
      draw.fill(testStreams(4).stream(round), picks);
      for (let place = 1; place < picks.length; place += 1)
        if (picks[place] !== ((picks[place - 1] ?? 0) + 1) % 1_000) starts += 1;
    }
    // A fresh start follows its predecessor by chance one time in a thousand; four standard errors of a share.
    const p = (1 / blockLength) * (1 - 1 / 1_000);
    const steps = 200 * 999;
    expect(Math.abs(starts / steps - p)).toBeLessThan(4 * Math.sqrt((p * (1 - p)) / steps));
  });

  test('a block whose word is left over by the cells starts at a place drawn anew', () => {
    // Blocks of 1.5 start below round(2^32/1.5) = 2,863,311,531, which is one more than ten cells; the last word below
    // it starts a block, and the place comes from the next word: ⌊0.625·10⌋ = 6, as the first came from ⌊0.25·10⌋ = 2.
    const words = [2 ** 30, 2_863_311_530, 0.625 * 2 ** 32];
    const picks = new Uint32Array(2);
    stationaryDraw(10, 1.5).fill({ nextUint32: () => words.shift() ?? 0 }, picks);
    expect([...picks]).toEqual([2, 6]);
  });

  test('the first value follows the last', () => {
    const picks = new Uint32Array(50);
    stationaryDraw(3, 1e6).fill(testStreams(5).stream(0), picks);
    for (let place = 1; place < picks.length; place += 1)
      expect(picks[place]).toBe(((picks[place - 1] ?? 0) + 1) % 3);
  });

  test('misuse throws', () => {
    expect(() => stationaryDraw(10, 0.5)).toThrow(/at least 1, got 0.5/);
    expect(() => stationaryDraw(10, Number.NaN)).toThrow(RangeError);
    expect(() => stationaryDraw(1_000, 1e9)).toThrow(/too many/);
  });
});
