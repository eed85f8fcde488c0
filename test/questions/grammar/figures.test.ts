import { expect, test } from 'vitest';
import { canonicalsOf, problemIn, questionIn } from '../asking.ts';

test.each([
  ['interval KELP 60d 95%', 'interval KELP 60d at 95%'],
  ['interval KELP 60d 95 %', 'interval KELP 60d at 95%'],
  ['interval KELP 60d 95 percent', 'interval KELP 60d at 95%'],
  ['interval KELP 60d at 95', 'interval KELP 60d at 95%'],
  ['interval KELP 60d at 0.95', 'interval KELP 60d at 95%'],
  ['interval KELP 60d at .95', 'interval KELP 60d at 95%'],
  ['interval KELP 60d at 95.0%', 'interval KELP 60d at 95%'],
  ['interval KELP 60d at 99.9', 'interval KELP 60d at 99.9%'],
  ['interval KELP 60d at 0.975', 'interval KELP 60d at 97.5%'],
  ['tail KELP at 99% confidence 90%', 'tail KELP 500d at 99% confidence 90% over 1d'],
  ['tail KELP confidence .9 99', 'refused'],
  ['tail KELP at 50%', 'tail KELP 500d at 50% confidence 95% over 1d'],
  ['claim KELP 20bp 95%', 'claim KELP 20bp 60d at 95%'],
  ['claim KELP 95% 20bp', 'claim KELP 20bp 60d at 95%'],
  ['claim KELP at 95% 0.2%', 'claim KELP 20bp 60d at 95%'],
  ['claim KELP 0.2%', 'claim KELP 20bp 60d at 95%'],
  ['claim KELP 20 bps', 'claim KELP 20bp 60d at 95%'],
  ['claim KELP 20bp a day', 'claim KELP 20bp 60d at 95%'],
  ['claim KELP +1.25bp', 'claim KELP 1.25bp 60d at 95%'],
  ['claim KELP −20bp', 'claim KELP -20bp 60d at 95%'],
  ['claim KELP 0bp', 'claim KELP 0bp 60d at 95%'],
  ['claim KELP 15% a year', 'claim KELP 15% a year 60d at 95%'],
  ['claim KELP 0.000001bp', 'claim KELP 0.000001bp 60d at 95%'],
  ['need KELP 1500bp a year', 'need KELP 15% a year 60d at 95% power 80%'],
])('%s: %s', (text, canonical) => {
  if (canonical === 'refused') expect(problemIn(text).code).toBe('ambiguous');
  else expect(canonicalsOf(text)).toEqual([canonical]);
});

test('20bp and 0.2% are the same size to the last bit', () => {
  expect(questionIn('claim KELP 20bp').question).toEqual(questionIn('claim KELP 0.2%').question);
});

test.each([
  ['on 2m USD', 'on 2m USD'],
  ['on 2M usd', 'on 2m USD'],
  ['on 2 million EUR', 'on 2m EUR'],
  ['on 2mm', 'on 2m'],
  ['on 2mn', 'on 2m'],
  ['on 1.5bn JPY', 'on 1.5bn JPY'],
  ['on 500k', 'on 500k'],
  ['on 2,000,000 USD', 'on 2m USD'],
  ['on 1,234,567.5 GBP', 'on 1234567.5 GBP'],
  ['on 500 shares', 'on 500 shares'],
  ['on -500 shares', 'on -500 shares'],
  ['on −2m USD', 'on -2m USD'],
  ['on 1 share', 'on 1 shares'],
  ['on 2.5k shares', 'on 2.5k shares'],
  // the lek and the whole history share a word; the word of the language wins
  ['on 2m all', 'all on 2m'],
])('the amount %s is written %s', (words, written) => {
  const [window, amount] = written.startsWith('all ') ? ['all', written.slice(4)] : ['500d', written];
  expect(canonicalsOf(`tail KELP ${words}`)).toEqual([
    `tail KELP ${window} at 99% confidence 95% over 1d ${amount}`,
  ]);
});

const tail99 = 'tail KELP 500d at 99% confidence 95% over 1d';

test.each([
  ['interval KELP 95', 'ambiguous', ['interval KELP 60d at 95%', 'interval KELP 95d at 95%']],
  ['interval KELP 60d 95', 'ambiguous', ['interval KELP 60d at 95%']],
  ['interval KELP 0.95', 'ambiguous', ['interval KELP 60d at 95%']],
  [
    'tail KELP 95',
    'ambiguous',
    ['tail KELP 500d at 95% confidence 95% over 1d', 'tail KELP 95d at 99% confidence 95% over 1d'],
  ],
  [
    'claim KELP 20',
    'ambiguous',
    ['claim KELP 20bp 60d at 95%', 'claim KELP 20% 60d at 95%', 'claim ratio KELP 20 60d at 95%'],
  ],
  ['claim KELP 20bp 95', 'ambiguous', ['claim KELP 20bp 60d at 95%', 'claim KELP 20bp 95d at 95%']],
  ['claim KELP 0.2% 95%', 'ambiguous', ['claim KELP 20bp 60d at 95%', 'claim KELP 95% 60d at 0.2%']],
  ['claim KELP 0.2% 5% at 95%', 'repeated', ['claim KELP 20bp 60d at 95%', 'claim KELP 5% 60d at 95%']],
  ['interval KELP 20260504', 'ambiguous', ['interval KELP since 2026-05-04 at 95%']],
  // the feed has a ticker 700
  ['interval 700 60d', 'ambiguous', ['interval `700` 60d at 95%']],
  ['interval KELP at 100%', 'levelOutside', ['interval KELP 60d at 95%', 'interval KELP 60d at 99%']],
  ['interval KELP at 0', 'levelOutside', ['interval KELP 60d at 95%', 'interval KELP 60d at 99%']],
  ['interval KELP 150%', 'levelOutside', ['interval KELP 60d at 95%', 'interval KELP 60d at 99%']],
  ['interval KELP at', 'missingPart', ['interval KELP 60d at 95%']],
  [
    'tail KELP at 5%',
    'levelOutside',
    ['tail KELP 500d at 95% confidence 95% over 1d', 'tail KELP beyond 5% 500d confidence 95%'],
  ],
  [
    'tail KELP 1%',
    'levelOutside',
    ['tail KELP 500d at 99% confidence 95% over 1d', 'tail KELP beyond 1% 500d confidence 95%'],
  ],
  [
    'tail KELP at 0.025',
    'levelOutside',
    ['tail KELP 500d at 97.5% confidence 95% over 1d', 'tail KELP beyond 2.5% 500d confidence 95%'],
  ],
  [
    'tail KELP at 49.9%',
    'levelOutside',
    ['tail KELP 500d at 50.1% confidence 95% over 1d', 'tail KELP beyond 49.9% 500d confidence 95%'],
  ],
  ['backtest KELP at 1%', 'levelOutside', ['backtest KELP 500d at 99% on window 250d']],
  ['tail KELP 99% 95%', 'repeated', [tail99, 'tail KELP 500d at 95% confidence 95% over 1d']],
  ['shape KELP 95% confidence 90%', 'repeated', ['shape KELP 500d confidence 95%']],
  ['tail KELP confidence', 'missingPart', [tail99]],
  ['claim KELP', 'missingPart', ['claim KELP 0bp 60d at 95%']],
  ['claim KELP 200%', 'sizeOutside', ['claim KELP 20bp 60d at 95%']],
  ['claim KELP 1000% a year', 'sizeOutside', ['claim KELP 20bp a year 60d at 95%']],
  ['claim ratio KELP', 'missingPart', ['claim ratio KELP 1 a year 60d at 95%']],
  ['claim ratio KELP 20bp', 'notForVerb', ['claim ratio KELP 1 a year 60d at 95%']],
  ['claim vol KELP 20bp', 'notForVerb', ['claim KELP 20bp 60d at 95%']],
  ['claim ratio KELP 1 robust', 'notForVerb', ['claim ratio KELP 1 60d at 95%']],
  ['interval ratio KELP robust', 'notForVerb', ['interval ratio KELP 60d at 95%']],
  ['need KELP', 'missingPart', ['need KELP 5bp 60d at 95% power 80%']],
  ['need KELP 0bp', 'sizeOutside', ['need KELP 5bp 60d at 95% power 80%']],
  [
    'need KELP -3bp',
    'sizeOutside',
    ['need KELP 3bp 60d at 95% power 80%', 'need KELP 5bp 60d at 95% power 80%'],
  ],
  ['tail KELP beyond', 'missingPart', [tail99]],
  ['tail KELP beyond -4%', 'sizeOutside', ['tail KELP beyond 4% 500d confidence 95%']],
  ['tail KELP beyond 0%', 'sizeOutside', ['tail KELP beyond 4% 500d confidence 95%']],
  ['tail KELP beyond 100%', 'sizeOutside', ['tail KELP beyond 4% 500d confidence 95%']],
  ['tail KELP beyond 4% at 99%', 'notForVerb', ['tail KELP beyond 4% 500d confidence 95%']],
  ['tail KELP beyond 4% over 10d', 'notForVerb', ['tail KELP beyond 4% 500d confidence 95%']],
  ['tail KELP over 10', 'missingPart', ['tail KELP 500d at 99% confidence 95% over 10d']],
  ['tail KELP over', 'missingPart', [tail99]],
  ['tail KELP over 2w', 'sizeOutside', ['tail KELP 500d at 99% confidence 95% over 10d']],
  ['tail KELP over 0d', 'sizeOutside', [tail99]],
  ['tail KELP over 251d', 'sizeOutside', ['tail KELP 500d at 99% confidence 95% over 250d']],
  ['tail KELP on', 'missingPart', [tail99]],
  ['tail KELP on €2m', 'missingPart', [tail99]],
  ['tail KELP on 0 USD', 'sizeOutside', [tail99]],
  ['tail KELP on 1m on 2m', 'repeated', [`${tail99} on 1m`, `${tail99} on 2m`]],
  ['backtest KELP on window', 'missingPart', ['backtest KELP 500d at 99% on window 250d']],
  ['tail KELP by garch', 'missingPart', [`${tail99} by filtered`, tail99]],
  ['tail KELP by studnt', 'missingPart', [`${tail99} by student`, tail99]],
  ['tail KELP by', 'missingPart', [tail99]],
  ['interval KELP as', 'missingPart', ['interval KELP 60d at 95%']],
])('%s is refused: %s', (text, code, suggestions) => {
  const problem = problemIn(text);
  expect(problem.code).toBe(code);
  expect(problem.suggestions).toEqual(suggestions);
});

test('the complement of a tail level is named in the message', () => {
  expect(problemIn('tail KELP at 5%').message).toContain('95%');
});
