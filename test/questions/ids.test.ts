import { expect, test } from 'vitest';
import { readRecordId, readSubscriptionId } from '../../src/questions/ids.ts';

// Crockford's base32 (crockford.com/base32.html): O reads as 0, I and L as 1, and there is no U; from memory.
test.each([
  ['R-7Q2M9K4TXD', 'R-7Q2M9K4TXD'],
  ['r-7q2m9k4txd', 'R-7Q2M9K4TXD'],
  ['R-OOIILLOOil', 'R-0011110011'],
  ['R-7Q2M9K4TXU', null],
  ['R-7Q2M9K4TX', null],
  ['R-7Q2M9K4TXDD', 'R-7Q2M9K4TXDD'],
  ['R-7Q2M9K4TXD7Q2M9K4TXD', 'R-7Q2M9K4TXD7Q2M9K4TXD'],
  ['R-7Q2M9K4TXD7Q2M9K4TXDD', null],
  ['R7Q2M9K4TXD', null],
  ['D-7Q2M9K4TXD', null],
])('%s is the record %s', (text, id) => {
  expect(readRecordId(text)).toBe(id);
});

test.each([
  ['D-12', 'D-12'],
  ['d-12', 'D-12'],
  ['w-7', 'W-7'],
  ['W-0', null],
  ['W-07', null],
  ['D-', null],
  ['X-7', null],
  ['D-1234567890', null],
])('%s is the subscription %s', (text, id) => {
  expect(readSubscriptionId(text)).toBe(id);
});
