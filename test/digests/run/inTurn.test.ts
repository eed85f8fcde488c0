import { expect, test } from 'vitest';
import { createInTurn } from '../../../src/digests/run/inTurn.ts';

/** Pieces of work that end when the test says so, and how many were ever under way together. */
const bench = (most: number) => {
  const inTurn = createInTurn(most);
  const begun: number[] = [];
  const ends = new Map<number, (fails: boolean) => void>();
  const start = (number: number): Promise<number> =>
    inTurn(() => {
      begun.push(number);
      return new Promise((resolve, reject) => {
        ends.set(number, (fails) => (fails ? reject(new Error(`work ${number}`)) : resolve(number)));
      });
    });
  return { begun, start, end: (number: number, fails = false) => ends.get(number)?.(fails) };
};

const settled = () => new Promise((resolve) => setImmediate(resolve));

test('at most so many are under way, the others in the order in which they came', async () => {
  const { begun, start, end } = bench(2);
  const all = [1, 2, 3, 4].map(start);
  await settled();
  expect(begun).toEqual([1, 2]);
  end(2);
  await settled();
  expect(begun).toEqual([1, 2, 3]);
  end(1);
  end(3);
  await settled();
  expect(begun).toEqual([1, 2, 3, 4]);
  end(4);
  expect(await Promise.all(all)).toEqual([1, 2, 3, 4]);
});

test('work that fails leaves its place to the next', async () => {
  const { begun, start, end } = bench(1);
  const failing = start(1);
  const next = start(2);
  await settled();
  end(1, true);
  await expect(failing).rejects.toThrow('work 1');
  await settled();
  expect(begun).toEqual([1, 2]);
  end(2);
  expect(await next).toBe(2);
  const later = start(3);
  await settled();
  expect(begun).toEqual([1, 2, 3]);
  end(3);
  expect(await later).toBe(3);
});
