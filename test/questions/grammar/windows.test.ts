import { expect, test } from 'vitest';
import { canonicalsOf, context, dayOf, problemIn, questionIn } from '../asking.ts';

/** What stands for the window in the canonical text of `interval KELP … at 95%`. */
const windowOf = (words: string, given = context): string =>
  questionIn(`interval KELP ${words} at 95%`, given)
    .canonical.replace(/^interval KELP /, '')
    .replace(/ at 95%$/, '');

test.each([
  ['60d', '60d'],
  ['60D', '60d'],
  ['60 days', '60d'],
  ['1 day', '1d'],
  ['last 60 d', '60d'],
  ['12w', '12w'],
  ['12 weeks', '12w'],
  ['3m', '3m'],
  ['3 months', '3m'],
  ['1y', '1y'],
  ['2 years', '2y'],
  ['10d', '10d'],
  ['ytd', 'ytd'],
  ['YTD', 'ytd'],
  ['all', 'all'],
  ['2026-01-02/2026-03-31', '2026-01-02/2026-03-31'],
  ['2026–01–02/2026–03–31', '2026-01-02/2026-03-31'],
  ['2026-01-02/2026-01-02', '2026-01-02/2026-01-02'],
])('%s is the window %s', (words, window) => {
  expect(windowOf(words)).toBe(window);
});

// 27 November 2026 is a Friday
test.each([
  ['since 2026-05-04', '2026-05-04'],
  ['since 4 May', '2026-05-04'],
  ['since 4th may', '2026-05-04'],
  ['since May 4', '2026-05-04'],
  ['since 4 May 2024', '2024-05-04'],
  ['since May 4, 2024', '2024-05-04'],
  ['since 1 Dec', '2025-12-01'],
  ['since 27 November', '2025-11-27'],
  ['since 26 nov', '2026-11-26'],
  ['since 29 february', '2024-02-29'],
  ['since 3 sept', '2026-09-03'],
  ['since monday', '2026-11-23'],
  ['since Thu', '2026-11-26'],
  ['since friday', '2026-11-20'],
  ['since sat', '2026-11-21'],
  ['since 2026-11-27', '2026-11-27'],
])('%s begins on %s', (words, iso) => {
  expect(windowOf(words)).toBe(`since ${iso}`);
});

test('across a century that has no leap day the latest 29 February is eight years back', () => {
  expect(windowOf('since 29 Feb', { ...context, today: dayOf('2104-02-20') })).toBe('since 2096-02-29');
});

test.each([
  // a date that can be read in two ways offers both
  [
    'since 04/05/2026',
    'badDate',
    ['interval KELP since 2026-05-04 at 95%', 'interval KELP since 2026-04-05 at 95%'],
  ],
  [
    'since 04/05',
    'badDate',
    ['interval KELP since 2026-05-04 at 95%', 'interval KELP since 2026-04-05 at 95%'],
  ],
  ['since 25/12/2025', 'badDate', ['interval KELP since 2025-12-25 at 95%']],
  [
    'since 4.5.26',
    'badDate',
    ['interval KELP since 2026-05-04 at 95%', 'interval KELP since 2026-04-05 at 95%'],
  ],
  ['since 2026/05/04', 'badDate', ['interval KELP since 2026-05-04 at 95%']],
  ['since 20260504', 'badDate', ['interval KELP since 2026-05-04 at 95%']],
  ['since 2026-02-30', 'badDate', ['interval KELP since 2026-02-28 at 95%']],
  ['since 31 June', 'badDate', ['interval KELP since 2026-06-30 at 95%']],
  ['since May', 'badDate', ['interval KELP since 2026-05-01 at 95%']],
  ['since 2025', 'badDate', ['interval KELP since 2025-01-01 at 95%']],
  ['since 2027-01-05', 'badDate', ['interval KELP since 2026-01-05 at 95%']],
  ['since', 'missingPart', ['interval KELP 60d at 95%']],
  ['since yesterday', 'missingPart', ['interval KELP 60d at 95%']],
  ['2026-03-31/2026-01-02', 'badDate', ['interval KELP 2026-01-02/2026-03-31 at 95%']],
  ['2026-02-30/2026-03-31', 'badDate', ['interval KELP 60d at 95%']],
  ['2027-01-01/2027-03-31', 'badDate', ['interval KELP 60d at 95%']],
  ['2026-05-04', 'ambiguous', ['interval KELP since 2026-05-04 at 95%']],
  ['4 May', 'ambiguous', ['interval KELP since 2026-05-04 at 95%']],
  ['04/05/2026', 'badDate', ['interval KELP since 2026-05-04 at 95%']],
  ['0d', 'windowEmpty', ['interval KELP 60d at 95%']],
  ['-5d', 'windowEmpty', ['interval KELP 60d at 95%']],
  ['1.5y', 'sizeOutside', ['interval KELP 18m at 95%', 'interval KELP 60d at 95%']],
  ['9999999d', 'sizeOutside', ['interval KELP 60d at 95%']],
  ['60d 3m', 'repeated', ['interval KELP 60d at 95%', 'interval KELP 3m at 95%']],
  ['60d 60d', 'repeated', ['interval KELP 60d at 95%']],
  ['ytd since 4 May', 'repeated', ['interval KELP ytd at 95%', 'interval KELP since 2026-05-04 at 95%']],
])('the window %s is refused: %s', (words, code, suggestions) => {
  const problem = problemIn(`interval KELP ${words} at 95%`);
  expect(problem.code).toBe(code);
  expect(problem.suggestions.filter((text) => !text.startsWith('help'))).toEqual(suggestions);
});

test('a length is a window unless it stands after over or on', () => {
  expect(canonicalsOf('tail KELP 10d')).toEqual(['tail KELP 10d at 99% confidence 95% over 1d']);
  expect(canonicalsOf('tail KELP over 10d')).toEqual(['tail KELP 500d at 99% confidence 95% over 10d']);
  expect(canonicalsOf('tail KELP 20d over 10d')).toEqual(['tail KELP 20d at 99% confidence 95% over 10d']);
  expect(canonicalsOf('tail KELP 2m')).toEqual(['tail KELP 2m at 99% confidence 95% over 1d']);
  expect(canonicalsOf('tail KELP on 2m USD')).toEqual([
    'tail KELP 500d at 99% confidence 95% over 1d on 2m USD',
  ]);
  expect(canonicalsOf('tail KELP 2m on 2m')).toEqual(['tail KELP 2m at 99% confidence 95% over 1d on 2m']);
  expect(canonicalsOf('backtest KELP 1y on window 500 days')).toEqual([
    'backtest KELP 1y at 99% on window 500d',
  ]);
});
