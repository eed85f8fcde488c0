import fc from 'fast-check';
import { expect, test } from 'vitest';
import { canonicalLine, canonicalText } from '../../src/questions/canonicalText.ts';
import { type Question, tailModels } from '../../src/questions/question.ts';
import { readMessage } from '../../src/questions/readMessage.ts';
import { createVocabulary } from '../../src/questions/vocabulary.ts';
import type { Level } from '../../src/terms/level.ts';
import { levelFromPercent } from '../../src/terms/level.ts';
import type { Window } from '../../src/terms/window.ts';
import { context, dayOf, questionIn, tickers } from './asking.ts';

const settings = { seed: 20261127, numRuns: 500 };

/** Levels from half up, so that they serve for tails too, with at most three decimals. */
const level: fc.Arbitrary<Level> = fc.integer({ min: 50_000, max: 99_999 }).map((thousandths) => {
  const read = levelFromPercent((thousandths / 1000).toString());
  if (read === null) throw new RangeError(`no level: ${thousandths}`);
  return read;
});

const day = fc.integer({ min: dayOf('1990-01-01'), max: context.today });

const window: fc.Arbitrary<Window> = fc.oneof(
  fc.record({ kind: fc.constant('returns' as const), count: fc.integer({ min: 1, max: 1_000_000 }) }),
  fc.record({
    kind: fc.constant('span' as const),
    amount: fc.integer({ min: 1, max: 999 }),
    unit: fc.constantFrom('week' as const, 'month' as const, 'year' as const),
  }),
  fc.constant({ kind: 'yearToDate' } as const),
  fc.constant({ kind: 'all' } as const),
  day.map((from) => ({ kind: 'since', day: from }) as const),
  fc
    .tuple(day, day)
    .map(([a, b]) => ({ kind: 'between', from: Math.min(a, b), to: Math.max(a, b) }) as const),
);

const sample = {
  window,
  windowAsked: fc.constant(true),
  returnType: fc.constantFrom('simple' as const, 'log' as const),
};

const ticker = fc.constantFrom(...tickers);
const side = fc.constantFrom('both' as const, 'above' as const, 'below' as const);
const hundredthsOfBasisPoint = (min: number, max: number) =>
  fc.integer({ min, max }).map((hundredths) => Number(`${hundredths}e-6`));
const per = fc.constantFrom('day' as const, 'year' as const);
const model = fc.option(fc.constantFrom(...tailModels));

const exposure = fc.option(
  fc.oneof(
    fc.record({
      kind: fc.constant('money' as const),
      amount: fc.integer({ min: -2_000_000_000, max: 2_000_000_000 }).filter((amount) => amount !== 0),
      currency: fc.constantFrom(null, 'USD', 'EUR', 'JPY'),
    }),
    fc.record({
      kind: fc.constant('shares' as const),
      shares: fc
        .integer({ min: -200_000, max: 200_000 })
        .filter((shares) => shares !== 0)
        .map((tenths) => tenths / 10),
    }),
  ),
);

const interval = fc
  .record({
    verb: fc.constant('interval' as const),
    of: fc.constantFrom('mean' as const, 'vol' as const, 'ratio' as const),
    ticker,
    ...sample,
    level,
    side,
    robust: fc.boolean(),
    annual: fc.boolean(),
  })
  .map((question) => ({ ...question, robust: question.robust && question.of !== 'ratio' }));

const claim = fc.oneof(
  fc.record({
    verb: fc.constant('claim' as const),
    of: fc.constant('mean' as const),
    ticker,
    claimed: fc.record({
      fraction: hundredthsOfBasisPoint(-999_999, 999_999).map((value) => value + 0),
      per,
    }),
    ...sample,
    level,
    side,
    robust: fc.boolean(),
  }),
  fc.record({
    verb: fc.constant('claim' as const),
    of: fc.constant('ratio' as const),
    ticker,
    claimed: fc.record({
      fraction: fc.integer({ min: -500, max: 500 }).map((hundredths) => hundredths / 100),
      per,
    }),
    ...sample,
    level,
    side,
    robust: fc.constant(false),
  }),
);

const need = fc.record({
  verb: fc.constant('need' as const),
  ticker,
  size: fc.record({ fraction: hundredthsOfBasisPoint(1, 999_999), per }),
  ...sample,
  level,
  power: level,
});

const compare = fc.oneof(
  fc.record({
    verb: fc.constant('compare' as const),
    ...sample,
    level,
    between: fc.constant('tickers' as const),
    tickers: fc.uniqueArray(ticker, { minLength: 2, maxLength: 5 }),
  }),
  fc.record({
    verb: fc.constant('compare' as const),
    ...sample,
    level,
    between: fc.constant('periods' as const),
    ticker,
    splitDay: day,
  }),
);

const tail = fc
  .record({
    verb: fc.constant('tail' as const),
    ticker,
    ...sample,
    tailLevel: level,
    confidence: level,
    horizonDays: fc.integer({ min: 1, max: 250 }),
    exposure,
    model,
    beyond: fc.option(hundredthsOfBasisPoint(1, 999_999)),
  })
  .map((question) =>
    question.beyond === null
      ? question
      : { ...question, tailLevel: context.defaults.tail.level, horizonDays: 1 },
  );

const shape = fc.record({ verb: fc.constant('shape' as const), ticker, ...sample, confidence: level });

const backtest = fc.record({
  verb: fc.constant('backtest' as const),
  ticker,
  ...sample,
  tailLevel: level,
  estimationReturns: fc.integer({ min: 1, max: 5000 }),
  model,
});

const question: fc.Arbitrary<Question> = fc.oneof(
  interval,
  claim,
  need,
  compare,
  tail,
  shape,
  backtest,
  fc.record({ verb: fc.constant('feed' as const), ticker: fc.option(ticker) }),
  fc.record({
    verb: fc.constant('again' as const),
    ids: fc.constantFrom(['R-7Q2M9K4TXD'] as const, ['R-7Q2M9K4TXD', 'R-3FHW8N0ZQC2K'] as const),
  }),
  fc.record({
    verb: fc.constant('records' as const),
    ticker: fc.option(ticker),
    since: fc.option(day),
    verify: fc.constant(false),
  }),
  fc.record({
    verb: fc.constant('help' as const),
    topic: fc.constantFrom(null, 'tail', 'windows', 'prices'),
  }),
);

const minutes = fc.integer({ min: 0, max: 1439 });
const zone = fc.constantFrom(
  'UTC',
  'Europe/London',
  'America/New_York',
  'America/Argentina/Ushuaia',
  'Asia/Tokyo',
);
const scheduleDays = fc.oneof(
  fc
    .constantFrom(
      'sessions' as const,
      'weekdays' as const,
      'daily' as const,
      'monthStart' as const,
      'monthEnd' as const,
    )
    .map((kind) => ({ kind })),
  fc.subarray([1, 2, 3, 4, 5, 6, 7], { minLength: 1 }).map((weekdays) => ({ kind: 'on' as const, weekdays })),
);
const someModel = fc.constantFrom(...tailModels);
const digestId = fc.constantFrom('D-1', 'D-12', 'D-999999999');
const watchId = fc.constantFrom('W-1', 'W-7');

const digest = fc.oneof(
  fc.record({
    verb: fc.constant('digest' as const),
    do: fc.constant('add' as const),
    tickers: fc.uniqueArray(ticker, { minLength: 1 }),
    schedule: fc.record({ days: scheduleDays, minutes, timeZone: zone }),
    window,
    tailLevel: level,
    model: someModel,
  }),
  fc.constant({ verb: 'digest', do: 'list' } as const),
  fc.record({
    verb: fc.constant('digest' as const),
    do: fc.constantFrom('now' as const, 'pause' as const, 'resume' as const, 'stop' as const),
    id: digestId,
  }),
  fc.record({
    verb: fc.constant('digest' as const),
    do: fc.constant('change' as const),
    id: digestId,
    change: fc.record({
      tickers: fc.uniqueArray(ticker),
      days: fc.option(scheduleDays),
      minutes,
      timeZone: fc.option(zone),
      window: fc.option(window),
      tailLevel: fc.option(level),
      model,
    }),
  }),
);

const watchedTail = fc.record({
  verb: fc.constant('tail' as const),
  ticker,
  ...sample,
  tailLevel: level,
  confidence: level,
  horizonDays: fc.constant(1),
  exposure: fc.constant(null),
  model: someModel,
  beyond: fc.constant(null),
});

const watch = fc.oneof(
  fc.record({
    verb: fc.constant('watch' as const),
    do: fc.constant('add' as const),
    watched: fc.constantFrom('var' as const, 'es' as const),
    crossing: fc.record({
      side: fc.constantFrom('above' as const, 'below' as const),
      fraction: hundredthsOfBasisPoint(1, 999_999),
    }),
    tail: fc
      .tuple(watchedTail, fc.integer({ min: 1, max: 250 }))
      .map(([tail, horizonDays]) => ({ ...tail, horizonDays })),
  }),
  fc.record({
    verb: fc.constant('watch' as const),
    do: fc.constant('add' as const),
    watched: fc.constant('loss' as const),
    crossing: fc.constant(null),
    tail: watchedTail,
  }),
  fc.constant({ verb: 'watch', do: 'list' } as const),
  fc.record({
    verb: fc.constant('watch' as const),
    do: fc.constantFrom('pause' as const, 'resume' as const, 'stop' as const),
    id: watchId,
  }),
);

test('a digest and a watch are read from their canonical text as they are, and keep it', () => {
  fc.assert(
    fc.property(fc.oneof(digest, watch), (asked) => {
      const text = canonicalText(asked);
      const read = questionIn(text);
      expect(read.question).toEqual(asked);
      expect(read.canonical).toBe(text);
      expect(read.assumed).toEqual([]);
    }),
    settings,
  );
});

test('the canonical text is read as the same question, with nothing assumed and the same text again', () => {
  fc.assert(
    fc.property(question, (asked) => {
      const text = canonicalText(asked);
      const read = questionIn(text);
      expect(read.question).toEqual(asked);
      expect(read.canonical).toBe(text);
      expect(read.assumed).toEqual([]);
    }),
    settings,
  );
});

test('the order, the case and the filler words of a question do not change its canonical text', () => {
  const pieces = [
    'KELP',
    '500d',
    'at 99%',
    'confidence 90%',
    'over 10d',
    'on 2m USD',
    'by student',
    'log',
    'tail',
    'please',
  ];
  const canonical = 'tail KELP 500d at 99% confidence 90% over 10d on 2m USD by student log';
  fc.assert(
    fc.property(fc.shuffledSubarray(pieces, { minLength: pieces.length }), fc.boolean(), (order, shouted) => {
      const text = order.join(' ');
      expect(questionIn(shouted ? text.toUpperCase() : text.toLowerCase()).canonical).toBe(canonical);
    }),
    settings,
  );
});

test('any ticker of letters, digits and the usual signs can be asked for as the canonical text writes it', () => {
  const sign = fc.constantFrom(...'ABCDEMRWXYabcdmrwy0123456789.-/^=&'.split(''));
  const name = fc
    .string({ unit: sign, minLength: 1, maxLength: 8 })
    .filter((text) => /[A-Za-z0-9]/.test(text));
  const language = fc.constantFrom(
    'AT',
    'ON',
    'ALL',
    'MAY',
    'D-12',
    'R-7Q2M9K4TXD',
    'VaR',
    'HELP',
    'A',
    'D',
    '60D',
    '95%',
    '5BP',
    '4',
    'AND',
    'a b',
  );
  fc.assert(
    fc.property(fc.oneof(name, language), (odd) => {
      const given = { ...context, vocabulary: createVocabulary(['KELP', odd]) };
      const asked: Question = {
        verb: 'compare',
        window: { kind: 'returns', count: 60 },
        windowAsked: true,
        returnType: 'simple',
        level: { digits: 95, places: 2 },
        between: 'tickers',
        tickers: ['KELP', odd],
      };
      expect(questionIn(canonicalText(asked), given).question).toEqual(asked);
    }),
    settings,
  );
});

test('questions that differ in their ticker alone are written as one line', () => {
  const asked = readMessage('interval KELP TARN `ALL` 60d', context).questions.flatMap((outcome) =>
    outcome.ok ? [outcome.value.question] : [],
  );
  expect(canonicalLine(asked)).toBe('interval KELP TARN `ALL` 60d at 95%');
  expect(canonicalLine([])).toBe('');
});
