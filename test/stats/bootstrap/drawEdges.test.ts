import { describe, expect, test } from 'vitest';
import { independentDraw, type ResampleDraw, stationaryDraw } from '../../../src/stats/bootstrap/draws.ts';
import { nextIndex } from '../../../src/stats/random/draws.ts';
import { testStreams } from '../testStreams.ts';

const streams = testStreams(13);

const fromWords = (draw: ResampleDraw, words: readonly number[], length: number): number[] => {
  const picks = new Uint32Array(length);
  let used = 0;
  draw.fill({ nextUint32: () => words[used++] ?? 0 }, picks);
  return [...picks];
};
const fromStream = (draw: ResampleDraw, length: number): number[] => {
  const picks = new Uint32Array(length);
  draw.fill(streams.stream(3), picks);
  return [...picks];
};

describe('picks from chosen words, by hand', () => {
  test('the first word past the 9 cells of 3² is rejected, the last one in them is not', () => {
    const accepted = 9 * Math.floor(2 ** 32 / 9);
    expect(fromWords(independentDraw(3), [accepted, 0], 2)).toEqual([0, 0]);
    expect(fromWords(independentDraw(3), [accepted - 1], 2)).toEqual([2, 2]);
  });

  test('up to 2^13 values one word gives two picks, beyond it one', () => {
    // 2^26 cells of 64 words each.
    expect(fromWords(independentDraw(8_192), [64 * (8_192 * 5 + 7)], 2)).toEqual([5, 7]);
    const random = streams.stream(3);
    expect(fromStream(independentDraw(8_193), 3)).toEqual([0, 1, 2].map(() => nextIndex(random, 8_193)));
  });

  test('the last of an odd number of picks is drawn on its own', () => {
    const random = streams.stream(3);
    const pair = new Uint32Array(2);
    independentDraw(1_000).fill(random, pair);
    expect(fromStream(independentDraw(1_000), 3)).toEqual([...pair, nextIndex(random, 1_000)]);
  });

  test('blocks of one value are independent picks', () => {
    expect(fromStream(stationaryDraw(7, 1), 9)).toEqual(fromStream(independentDraw(7), 9));
  });

  test('a word equal to the chance of a new block starts none', () => {
    expect(fromWords(stationaryDraw(4, 2), [0, 2 ** 31, 0, 0], 2)).toEqual([0, 1]);
    // One less lies in the last of the four cells.
    expect(fromWords(stationaryDraw(4, 2), [0, 2 ** 31 - 1, 0, 0], 2)).toEqual([0, 3]);
  });
});
