import { createHash } from 'node:crypto';
import { expect, test } from 'vitest';
import { methodVersion } from '../../src/answers/answer.ts';
import { fingerprintOf, identify } from '../../src/answers/identity.ts';

const used = { ticker: 'KELP', days: Int32Array.of(1, 2, 3), closes: Float64Array.of(10, 11, 12) };

test('an id is R- and ten letters of Crockford’s base32', () => {
  expect(identify('interval KELP 60d at 95%', [used]).id).toMatch(/^R-[0-9A-HJKMNP-TV-Z]{10}$/);
});

test('the id is the first fifty bits of a hash of question, data, method version and seed', () => {
  const { id, seed, dataFingerprint } = identify('interval KELP', [used]);
  const digest = createHash('sha256')
    .update(['interval KELP', dataFingerprint, methodVersion, seed].join('\n'))
    .digest();
  const value = (digest.readBigUInt64BE(0) >> 14n).toString(2).padStart(50, '0');
  const places = id
    .slice(2)
    .split('')
    .map((letter) => '0123456789ABCDEFGHJKMNPQRSTVWXYZ'.indexOf(letter));
  expect(places.map((place) => place.toString(2).padStart(5, '0')).join('')).toBe(value);
});

test('the same question on the same data has the same seed; another question, ticker, day or close has another', () => {
  const first = identify('interval KELP', [used]);
  expect(identify('interval KELP', [{ ...used }])).toEqual(first);
  const others = [
    identify('interval KELP log', [used]),
    identify('interval KELP', [{ ...used, ticker: 'TARN' }]),
    identify('interval KELP', [{ ...used, days: Int32Array.of(1, 2, 4) }]),
    identify('interval KELP', [{ ...used, closes: Float64Array.of(10, 11, 12.000000000000002) }]),
  ];
  expect(new Set([first, ...others].map(({ seed }) => seed)).size).toBe(5);
});

test('a fingerprint speaks of the values, not of the memory they stand in', () => {
  const shared = new Float64Array(new SharedArrayBuffer(5 * 8), 8, 3);
  shared.set(used.closes);
  expect(fingerprintOf([{ ...used, closes: shared }])).toBe(fingerprintOf([used]));
});
