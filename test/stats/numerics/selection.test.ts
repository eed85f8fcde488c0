import { expect, it } from 'vitest';
import { putLargestLast } from '../../../src/stats/numerics/selection.ts';

/** 7919·i mod 10007 runs through 1…10006 in disorder, since 10007 is prime. */
const disorder = (): Float64Array =>
  Float64Array.from({ length: 10_006 }, (_, i) => (7919 * (i + 1)) % 10_007);

const ordered = (values: Float64Array): number => {
  let start = values.length - 1;
  while (start > 0 && (values[start - 1] as number) <= (values[start] as number)) start -= 1;
  return values.length - start;
};

it.each([1, 10, 100, 2_000])('puts the largest %s last and leaves most of the others alone', (count) => {
  const values = disorder();
  putLargestLast(values, count);
  // the values are 1…10006, so the largest are known
  const expected = Array.from({ length: count }, (_, i) => 10_006 - count + 1 + i);
  expect([...values.subarray(values.length - count)]).toEqual(expected);
  // a short range of 24 and one value more is sorted with them, and chance may add a few
  expect(ordered(values)).toBeLessThanOrEqual(count + 24 + 8);
  expect(values.toSorted().every((value, i) => value === i + 1)).toBe(true);
});

it('splits a range of 26 values and sorts one of 25', () => {
  const falling = (length: number) => Float64Array.from({ length }, (_, i) => length - i);
  const short = falling(25);
  putLargestLast(short, 1);
  expect([...short]).toEqual([...falling(25)].reverse());
  const values = Float64Array.from({ length: 26 }, (_, i) => (7 * (i + 1)) % 29);
  const largest = Math.max(...values);
  putLargestLast(values, 1);
  expect(values[25]).toBe(largest);
  expect(ordered(values)).toBeLessThan(26);
});
