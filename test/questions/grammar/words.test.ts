import { expect, test } from 'vitest';
import { readMessage } from '../../../src/questions/readMessage.ts';
import { createVocabulary } from '../../../src/questions/vocabulary.ts';
import { canonicalsOf, context, problemIn, questionIn, questionsIn } from '../asking.ts';

test.each([
  'please',
  'pls',
  'thanks',
  "what's",
  'the',
  'is',
  'for',
  'of',
  'makes',
  'about',
  'a day',
  'last',
  'vs',
  'and',
  'same',
])('the word %s is skipped', (filler) => {
  expect(canonicalsOf(`interval ${filler} KELP 60d`)).toEqual(['interval KELP 60d at 95%']);
  expect(canonicalsOf(`${filler.toUpperCase()} interval KELP 60d`)).toEqual(['interval KELP 60d at 95%']);
  expect(readMessage(filler, context).questions).toEqual([]);
});

test.each([
  ['interval KELP,TARN 60d', ['interval KELP 60d at 95%', 'interval TARN 60d at 95%']],
  ['interval KELP TARN', ['interval KELP 60d at 95%', 'interval TARN 60d at 95%']],
  ['interval (KELP), "TARN"; 60d!', ['interval KELP 60d at 95%', 'interval TARN 60d at 95%']],
  ['interval KELP/TARN/60d', ['interval KELP 60d at 95%', 'interval TARN 60d at 95%']],
  ['interval EUR/USD 60d', ['interval EUR/USD 60d at 95%']],
  ['interval eur/usd/kelp 60d', ['interval EUR/USD 60d at 95%', 'interval KELP 60d at 95%']],
  ["interval KELP's 60d", ['interval KELP 60d at 95%']],
  ['interval KELP.ONE. 60d.', ['interval KELP.ONE 60d at 95%']],
  ['interval brk-b - 60d', ['interval BRK-B 60d at 95%']],
  ['interval KELP & TARN', ['interval KELP 60d at 95%', 'interval TARN 60d at 95%']],
  ['interval `ALL`', ['interval `ALL` 60d at 95%']],
  ['interval `all` all', ['interval `ALL` all at 95%']],
  ['interval `ES` `for` 3m', ['interval `ES` 3m at 95%', 'interval `FOR` 3m at 95%']],
  // unit letters and names of months are words only in their places
  ['interval M 60d', ['interval `M` 60d at 95%']],
  ['interval MAY since 4 May', ['interval `MAY` since 2026-05-04 at 95%']],
  ['`interval KELP 60d`', ['interval KELP 60d at 95%']],
  ['interval `KELP` `60d`', ['interval KELP 60d at 95%']],
  ['compare KELP TARN WREN', ['compare KELP TARN WREN 60d at 95%']],
  ['feed KELP TARN', ['feed KELP', 'feed TARN']],
])('%s names its tickers', (text, canonicals) => {
  expect(canonicalsOf(text)).toEqual(canonicals);
});

test.each([
  ['interval ALL 60d', 'repeated', 'interval `ALL` 60d at 95%'],
  ['interval ALL', 'noTicker', 'interval `ALL` 60d at 95%'],
  ['interval FOR 60d', 'noTicker', 'interval `FOR` 60d at 95%'],
  ['interval 60d', 'noTicker', 'interval KELP 60d at 95%'],
  ['interval KELP KELP', 'repeated', 'interval KELP 60d at 95%'],
  ['interval KELP kelp.one KELP', 'repeated', 'interval KELP KELP.ONE 60d at 95%'],
  ['interval KELP TARN WREN `ALL` `ES` M', 'tooManyTickers', 'interval KELP TARN WREN `ALL` `ES` 60d at 95%'],
  ['compare KELP TARN WREN `ALL` `ES` M', 'tooManyTickers', 'compare KELP TARN WREN `ALL` `ES` 60d at 95%'],
  ['compare KELP', 'missingPart', 'compare KELP before 2026-01-01 all at 95%'],
  ['compare KELP since 4 May', 'missingPart', 'compare KELP before 2026-01-01 since 2026-05-04 at 95%'],
  ['compare KELP TARN before 4 May', 'notForVerb', 'compare KELP TARN 60d at 95%'],
  ['compare KELP 2026-05-04', 'ambiguous', 'compare KELP before 2026-05-04 all at 95%'],
  ['compare KELP before', 'missingPart', 'compare KELP before 2026-01-01 all at 95%'],
  ['interval KELQ', 'unknownTicker', 'interval KELP 60d at 95%'],
  ['interval kelq 60d', 'unknownTicker', 'interval KELP 60d at 95%'],
  ['compare KELP TARM', 'unknownTicker', 'compare KELP TARN 60d at 95%'],
  ['compare kelq tarm', 'unknownTicker', 'compare KELP TARN 60d at 95%'],
  ['interval KELP.TWO', 'unknownTicker', 'interval KELP 60d at 95%'],
  ['interval ZZZZZZ', 'unknownTicker', 'interval KELP 60d at 95%'],
  ['help KELP', 'notForVerb', 'help'],
  ['help tial', 'unreadableWords', 'help tail'],
])('%s is refused: %s', (text, code, suggestion) => {
  const problem = problemIn(text);
  expect(problem.code).toBe(code);
  expect(problem.suggestion).toBe(suggestion);
});

test('an unknown ticker gets the closest ones of the feed', () => {
  expect(problemIn('interval KELQ').message).toBe('“KELQ” (word 2) is not in the feed. Closest: KELP.');
  expect(problemIn('interval ZZZZZZ').message).toBe(
    '“ZZZZZZ” (word 2) is not in the feed. Ask feed for what is there.',
  );
});

test.each([
  ['interval KELP over 10d', 'interval KELP 60d at 95%'],
  ['interval KELP on 2m', 'interval KELP 60d at 95%'],
  ['interval KELP by student', 'interval KELP 60d at 95%'],
  ['interval KELP 20bp', 'interval KELP 60d at 95%'],
  ['interval KELP beyond 4%', 'interval KELP 60d at 95%'],
  ['interval KELP power 90%', 'interval KELP 60d at 95%'],
  ['interval KELP before 4 May', 'interval KELP 60d at 95%'],
  ['interval KELP R-7Q2M9K4TXD', 'interval KELP 60d at 95%'],
  ['interval KELP D-12', 'interval KELP 60d at 95%'],
  ['interval KELP confidence 90%', 'interval KELP 60d at 90%'],
  ['tail KELP above', 'tail KELP 500d at 99% confidence 95% over 1d'],
  ['tail KELP robust', 'tail KELP 500d at 99% confidence 95% over 1d'],
  ['tail KELP a year', 'tail KELP 500d at 99% confidence 95% over 1d'],
  ['tail KELP on window 500d', 'tail KELP 500d at 99% confidence 95% over 1d'],
  ['tail KELP vol', 'tail KELP 500d at 99% confidence 95% over 1d'],
  ['backtest KELP over 10d', 'backtest KELP 500d at 99% on window 250d'],
  ['compare KELP TARN above', 'compare KELP TARN 60d at 95%'],
  ['shape KELP ratio', 'shape KELP 500d confidence 95%'],
  ['need KELP 5bp above', 'need KELP 5bp 60d at 95% power 80%'],
  ['feed KELP 60d', 'feed KELP'],
])('%s holds what does not go with the verb', (text, suggestion) => {
  const problem = problemIn(text);
  expect(problem.code).toBe('notForVerb');
  expect(problem.suggestion).toBe(suggestion);
});

test.each([
  ['interval KELP as picture', ['picture']],
  ['interval KELP as json as picture', ['json', 'picture']],
  ['feed as json', ['json']],
  ['interval KELP', []],
])('%s wishes for %s', (text, wishes) => {
  expect(questionIn(text).wishes).toEqual(wishes);
});

test('a suggestion keeps the form that was wished for', () => {
  expect(problemIn('interval KELQ as picture').suggestion).toBe('interval KELP 60d at 95% as picture');
});

test('a word is shown back up to 40 characters, a mention and a bare mark not at all', () => {
  const long = problemIn(`interval KELP ${'x'.repeat(300)}`).message;
  expect(long).toContain(`“${'x'.repeat(39)}…” (word 3)`);
  expect(problemIn('interval KELP <@U2>').message).toMatch(/^A mention \(word 3\) cannot be read/);
  expect(problemIn('interval KELP #general').message).toMatch(/^A mention \(word 3\) cannot be read/);
  expect(problemIn('interval KELP * 5').message).toMatch(/^A sign \(word 3\) cannot be read/);
  expect(problemIn('interval KELP _<b>|x|~1~').message).toMatch(/^“bx1” \(word 3\) cannot be read/);
});

test('a ticker of the feed is no request for something that is not answered', () => {
  const given = { ...context, vocabulary: createVocabulary(['UP', 'KELP']) };
  expect(problemIn('UP 60d', given)).toMatchObject({ code: 'noVerb', suggestion: 'interval UP 60d at 95%' });
});

test('further lines that begin with a verb are answered in order, three in all', () => {
  const text = 'interval KELP\nand tail KELP\nfeed\nshape TARN';
  const [first, second, third, more, none] = readMessage(text, context).questions;
  expect(
    [first, second, third].map((outcome) => outcome?.ok === true && outcome.value.question.verb),
  ).toEqual(['interval', 'tail', 'feed']);
  expect(more).toMatchObject({
    ok: false,
    problem: {
      code: 'tooManyLines',
      suggestion: 'shape TARN 500d confidence 95%',
      position: { start: 33, end: 38 },
    },
  });
  expect(none).toBe(undefined);
});

test('a line that does not begin with a verb goes on with the one before it', () => {
  expect(canonicalsOf('interval KELP\n20d at 90%\nthanks')).toEqual(['interval KELP 20d at 90%']);
  expect(canonicalsOf('interval\nKELP\n\nvol TARN')).toEqual([
    'interval KELP 60d at 95%',
    'interval vol TARN 60d at 95%',
  ]);
});

test('quotation and list marks before a line are skipped', () => {
  expect(canonicalsOf('&gt; 1. interval KELP\n&gt; 2) feed\n• feed TARN')).toEqual([
    'interval KELP 60d at 95%',
    'feed',
    'feed TARN',
  ]);
});

test('every question says where it stood, every problem which words it is about', () => {
  expect(questionsIn('interval KELP TARN\ntail KELP').map(({ position }) => position)).toEqual([
    { start: 0, end: 18 },
    { start: 0, end: 18 },
    { start: 19, end: 28 },
  ]);
  expect(problemIn('interval KELP foo bar 60d')).toMatchObject({
    code: 'unreadableWords',
    message:
      '“foo” (word 3), “bar” (word 4) cannot be read here. Leave out what is not needed, or ask help for what can be said.',
    position: { start: 14, end: 21 },
  });
  expect(problemIn('interval KELP since 04/05/2026').position).toEqual({ start: 20, end: 30 });
});

test('a message that is too long is not read', () => {
  expect(questionsIn(`interval KELP${' '.repeat(1987)}`)).toHaveLength(1);
  const problem = problemIn(`interval KELP${' '.repeat(1988)}`);
  expect(problem.code).toBe('messageTooLong');
  expect(problem.message).toContain('2001 characters');
});

test.each(['', '   ', '\n\n', '<@U1>', '<@U1> thanks', '?!', '-'])('%j asks nothing', (text) => {
  expect(readMessage(text, context).questions).toEqual([]);
});
