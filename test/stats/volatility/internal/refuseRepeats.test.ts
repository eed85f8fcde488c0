import { expect, test } from 'vitest';
import { refuseRepeats } from '../../../../src/stats/volatility/internal/refuseRepeats.ts';

/** `moving` stands for a return that never comes twice, `0.5` for the one that repeats. */
const returnsOf = (pattern: string): Float64Array =>
  Float64Array.from([...pattern], (sign, day) => (sign === '0' ? 0.5 : day + 1));

// By hand. A repeat is a 0 after a 0, a break a - after a 0.
test.each([
  ['two thirds of all', '00-00-', true],
  ['just below two thirds, a repeat for each break', '00-00-00-00--', false],
  ['a third of all, two repeats for the one break', '000------', true],
  ['a third of all, one repeat for the one break', '00----', false],
  ['a third of all at the end, repeats alone', '------000', true],
  ['below a third, in one run', '000-------', false],
  ['nothing that repeats', '------', false],
])('%s', (_, pattern, refused) => {
  expect(refuseRepeats(returnsOf(pattern), 'A GARCH fit') !== null).toBe(refused);
});

test('the refusal says which return, and how often', () => {
  expect(refuseRepeats(returnsOf('000------'), 'A GARCH fit')?.problem).toMatchObject({
    code: 'likelihoodUnbounded',
    message: expect.stringMatching(
      /^A GARCH fit needs returns that seldom repeat, and the return 0\.5 occurs 3 times in 9: its likelihood/,
    ),
  });
});
