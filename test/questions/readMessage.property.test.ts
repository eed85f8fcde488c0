import fc from 'fast-check';
import { expect, test } from 'vitest';
import { cleanMessage } from '../../src/questions/cleanMessage.ts';
import { type ReadingProblem, readMessage } from '../../src/questions/readMessage.ts';
import { problemCodes } from '../../src/terms/problem.ts';
import { context, questionsIn } from './asking.ts';

const settings = { seed: 20261127, numRuns: 1000 };

/** Any sequence of UTF-16 code units, lone surrogates and control characters among them. */
const anyText = fc
  .array(fc.oneof(fc.integer({ min: 0, max: 0xffff }), fc.integer({ min: 0, max: 0x7f })), { maxLength: 120 })
  .map((codes) => String.fromCharCode(...codes));

/** Words of the language, of the platform and of nobody, in any order. */
const scraps = fc.constantFrom(
  'interval',
  'tail',
  'VaR',
  'claim',
  'need',
  'compare',
  'shape',
  'backtest',
  'help',
  'feed',
  'book',
  'vol',
  'watch',
  'digest',
  'list',
  'change',
  'D-12',
  'W-7',
  '08:30',
  '8.30 pm',
  'month',
  'start',
  'mon,thu',
  'london',
  'Europe/Berlin',
  'loss',
  'KELP',
  'kelp.one',
  'TARN',
  'KELQ',
  '`ALL`',
  'ALL',
  'EUR/USD',
  '60d',
  '3 months',
  '12w',
  'ytd',
  'since',
  '4 May',
  '04/05/2026',
  '2026-05-04',
  '2026-01-02/2026-03-31',
  'before',
  'monday',
  '95%',
  'at',
  '95',
  '0.95',
  'confidence',
  '90%',
  'over',
  '10d',
  'on',
  '2m',
  'USD',
  '-500',
  'shares',
  'by',
  'student',
  'garch',
  '20bp',
  '-5bp',
  'a year',
  'a',
  'beyond',
  '4%',
  'above',
  'log',
  'robust',
  'power',
  'as',
  'json',
  'on window',
  'please',
  'and',
  '\n',
  ',',
  '/',
  '*',
  '`',
  '_',
  '<@U1>',
  '<!channel>',
  '<#C1|x>',
  '<http://e.com|e.com>',
  '<http://evil.com/a|click_*me*>',
  '@here',
  '#general',
  '&lt;!here&gt;',
  'http://evil.com',
  '&amp;',
  '*bold*',
  ':smile:',
  'mailto:a@b.com',
  '\uD800',
  '\u202e',
  '“',
  '999999999999d',
  '1e400',
  '0',
  'correlation',
  'up',
);
const message = fc.array(scraps, { maxLength: 14 }).map((parts) => parts.join(' '));

const problemsIn = (text: string): readonly ReadingProblem[] =>
  readMessage(text, context).questions.flatMap((outcome) => (outcome.ok ? [] : [outcome.problem]));

/** What a platform or a terminal would act on, and what no ticker of the feed and no word of ours holds. */
const forbidden = /[<>@#|*_~]|:\/\/|&|\uFFFC|[\p{Cc}\p{Cf}\p{Cs}]|:[a-z]+:|mailto:|tel:/u;

const isClean = (problem: ReadingProblem): void => {
  expect(problem.message).not.toMatch(forbidden);
  for (const suggestion of problem.suggestions) expect(suggestion).not.toMatch(forbidden);
};

test.each([
  ['any text', anyText],
  ['scraps of questions', message],
] as const)(
  '%s never throws, and whatever it is refused for is said without marks, links or mentions',
  (_, texts) => {
    fc.assert(
      fc.property(texts, (text) => {
        for (const problem of problemsIn(text)) {
          expect(Object.keys(problemCodes)).toContain(problem.code);
          expect(problem.suggestion).toBe(problem.suggestions[0] ?? null);
          expect(problem.message.length).toBeLessThan(400);
          isClean(problem);
        }
      }),
      settings,
    );
  },
);

test('every suggestion is read whole, and every position lies in the cleaned text', () => {
  fc.assert(
    fc.property(message, (text) => {
      const reading = readMessage(text, context);
      for (const outcome of reading.questions) {
        const position = outcome.ok ? outcome.value.position : outcome.problem.position;
        if (position !== null) {
          expect(position.start).toBeLessThan(position.end);
          expect(position.end).toBeLessThanOrEqual(reading.text.length);
        }
        if (outcome.ok) continue;
        for (const suggestion of outcome.problem.suggestions) expect(questionsIn(suggestion)).not.toEqual([]);
      }
    }),
    settings,
  );
});

test('a refused line has a suggestion wherever help can be asked', () => {
  fc.assert(
    fc.property(message, (text) => {
      for (const problem of problemsIn(text))
        if (problem.code !== 'tooManyLines') expect(problem.suggestion).not.toBe(null);
    }),
    settings,
  );
});

test('at most three questions of five tickers each are answered', () => {
  fc.assert(
    fc.property(message, (text) => {
      const { questions } = readMessage(text, context);
      expect(questions.filter(({ ok }) => ok).length).toBeLessThanOrEqual(15);
    }),
    settings,
  );
});

test('cleaning gives one origin inside the original for every character', () => {
  fc.assert(
    fc.property(fc.oneof(anyText, message), (text) => {
      const clean = cleanMessage(text);
      const { start, end } = clean.originalPosition({ start: 0, end: clean.text.length });
      expect(start).toBeLessThanOrEqual(end);
      expect(end).toBeLessThanOrEqual(text.length);
    }),
    settings,
  );
});

/** Processor time, so that a busy machine does not fail the test; the best of three. */
const bestMs = (run: () => void): number => {
  const times = Array.from({ length: 3 }, () => {
    const begun = process.cpuUsage();
    run();
    const { user, system } = process.cpuUsage(begun);
    return (user + system) / 1000;
  });
  return Math.min(...times);
};

// The bounds are loose: they tell work that grows with the square of the length (half a minute here) from work that does not.
test.each([
  '<',
  '<<>',
  '`',
  '`a',
  '*a ',
  '*',
  '&',
  '&amp;',
  '-',
  "'",
  '\n',
  'a,',
  '1,',
  'a/',
  '@',
  '<@U1>',
  '\u200b',
  '_a_',
])('cleaning 200,000 characters of %j is quick', (scrap) => {
  const text = scrap.repeat(Math.ceil(200_000 / scrap.length));
  expect(bestMs(() => void cleanMessage(text))).toBeLessThan(2000);
  expect(readMessage(text, context).questions.map((outcome) => !outcome.ok && outcome.problem.code)).toEqual([
    'messageTooLong',
  ]);
});

test.each([
  'interval ',
  'KELP ',
  'since ',
  '95% ',
  '1 ',
  'a/',
  'a, ',
  'foo ',
  '60d ',
  '`a` ',
  'on 2m ',
  '04/05/2026 ',
  'tail KELQ\n',
  'KELQ ',
])('the longest message of %j is read in no time', (scrap) => {
  for (const verb of ['', 'interval ', 'claim ']) {
    const text = `${verb}${scrap.repeat(2000)}`.slice(0, 2000);
    expect(bestMs(() => void readMessage(text, context))).toBeLessThan(200);
  }
});
