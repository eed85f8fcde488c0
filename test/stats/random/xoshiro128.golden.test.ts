import { describe, expect, it } from 'vitest';
import { createStreams, xoshiro128PlusPlus } from '../../../src/stats/random/xoshiro128.ts';
import type { Random } from '../../../src/terms/random.ts';

const take = (random: Random, count: number): number[] =>
  Array.from({ length: count }, () => random.nextUint32());

describe('xoshiro128++', () => {
  it('draws what the authors’ program draws', () => {
    // state 1, 2, 3, 4: produced with the authors' xoshiro128plusplus.c, as quoted by the tests of the crate rand_xoshiro
    expect(take(xoshiro128PlusPlus(1, 2, 3, 4), 10)).toEqual([
      641, 1573767, 3222811527, 3517856514, 836907274, 4247214768, 3867114732, 1355841295, 495546011,
      621204420,
    ]);
  });

  it('draws what the recurrence, written apart with whole numbers of any size, draws', () => {
    // Python 3.11 integers: a million steps from 1, 2, 3, 4, and a state with every upper bit set
    const random = xoshiro128PlusPlus(1, 2, 3, 4);
    let last = 0;
    for (let draw = 0; draw < 1_000_000; draw += 1) last = random.nextUint32();
    expect(last).toBe(2200123092);
    expect(take(xoshiro128PlusPlus(0xdeadbeef, 0x80000000, 0xffffffff, 0x7fffffff), 6)).toEqual([
      898446878, 3396520096, 2076015221, 1347683336, 4161670211, 2218447274,
    ]);
  });

  it('throws on the state it could not leave', () => {
    expect(() => xoshiro128PlusPlus(0, 0, 0, 0)).toThrow(
      'xoshiro128PlusPlus: the state must not be all zero',
    );
  });
});

describe('streams', () => {
  const seed = Uint8Array.from({ length: 32 }, (_, index) => index);

  it.each([
    // the seeding as its doc block words it, written apart in Python 3.11 integers; seed bytes 0, 1, … 31
    [0, [4013329020, 3669851150, 2076019514, 422889427]],
    [1, [2133756571, 2109488485, 4009677957, 586803218]],
    [9998, [1705158998, 733471548, 488268401, 1747765259]],
    [2 ** 32 + 5, [3185701445, 101608846, 649325094, 3527474127]],
    [2 ** 53 - 1, [1679738906, 442516353, 2673102060, 4234001294]],
  ])('replicate %d', (replicate, expected) => {
    const streams = createStreams(seed);
    expect(take(streams.stream(replicate), 4)).toEqual(expected);
    expect(take(streams.stream(replicate), 4), 'asked for again').toEqual(expected);
  });

  it('depends on every byte of the seed', () => {
    const first = take(createStreams(seed).stream(3), 4);
    for (let place = 0; place < 32; place += 1) {
      const other = Uint8Array.from(seed);
      other[place] = (other[place] ?? 0) ^ 1;
      expect(take(createStreams(other).stream(3), 4), `byte ${place}`).not.toEqual(first);
    }
  });

  it('throws on a seed or a replicate number of the wrong kind', () => {
    expect(() => createStreams(new Uint8Array(31))).toThrow(/31 bytes/);
    for (const replicate of [-1, 0.5, Number.NaN, 2 ** 53]) {
      expect(() => createStreams(seed).stream(replicate), String(replicate)).toThrow(
        `createStreams: replicate number ${replicate} is not a whole number from 0`,
      );
    }
  });
});
