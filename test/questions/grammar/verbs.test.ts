import { expect, test } from 'vitest';
import type { Question } from '../../../src/questions/question.ts';
import { canonicalsOf, context, dayOf, percent, problemIn, questionIn } from '../asking.ts';

const sample = (count: number, windowAsked = true) =>
  ({ window: { kind: 'returns', count }, windowAsked, returnType: 'simple' }) as const;

const mean = {
  verb: 'interval',
  of: 'mean',
  ticker: 'KELP',
  side: 'both',
  robust: false,
  annual: false,
} as const;
const tail = {
  verb: 'tail',
  ticker: 'KELP',
  tailLevel: percent(99),
  confidence: percent(95),
  horizonDays: 1,
  exposure: null,
  model: null,
  beyond: null,
} as const;
const claim = {
  verb: 'claim',
  of: 'mean',
  ticker: 'KELP',
  level: percent(95),
  side: 'both',
  robust: false,
} as const;
const size = (fraction: number, per: 'day' | 'year' = 'day') => ({ fraction, per });
const threeMonths = {
  window: { kind: 'span', amount: 3, unit: 'month' },
  windowAsked: true,
  returnType: 'simple',
} as const;
const allDefault = { window: { kind: 'all' }, windowAsked: false, returnType: 'simple' } as const;

const questions: readonly (readonly [string, Question])[] = [
  ['interval KELP 60d at 95%', { ...mean, ...sample(60), level: percent(95) }],
  ['interval mean KELP', { ...mean, ...sample(60, false), level: percent(95) }],
  ['interval vol KELP 3m', { ...mean, ...threeMonths, of: 'vol', level: percent(95) }],
  [
    'interval ratio KELP 60d a year',
    { ...mean, ...sample(60), of: 'ratio', level: percent(95), annual: true },
  ],
  [
    'interval KELP above robust log',
    { ...mean, ...sample(60, false), level: percent(95), side: 'above', robust: true, returnType: 'log' },
  ],
  [
    'tail KELP at 99% over 10d on 2m USD by student',
    {
      ...tail,
      ...sample(500, false),
      horizonDays: 10,
      exposure: { kind: 'money', amount: 2_000_000, currency: 'USD' },
      model: 'student',
    },
  ],
  ['tail KELP beyond 4% 500d', { ...tail, ...sample(500), beyond: 0.04 }],
  [
    'tail KELP beyond 400bp confidence 90% on -500 shares',
    {
      ...tail,
      ...sample(500, false),
      beyond: 0.04,
      confidence: { digits: 9, places: 1 },
      exposure: { kind: 'shares', shares: -500 },
    },
  ],
  ['shape KELP 3m', { verb: 'shape', ticker: 'KELP', ...threeMonths, confidence: percent(95) }],
  ['claim KELP 20bp 60d', { ...claim, ...sample(60), claimed: size(0.002) }],
  ['claim KELP 15% a year', { ...claim, ...sample(60, false), claimed: size(0.15, 'year') }],
  ['claim KELP -0.2% below', { ...claim, ...sample(60, false), claimed: size(-0.002), side: 'below' }],
  [
    'claim ratio KELP 1.2 a year',
    { ...claim, ...sample(60, false), of: 'ratio', claimed: size(1.2, 'year') },
  ],
  [
    'claim ratio KELP 0.1 99%',
    { ...claim, ...sample(60, false), of: 'ratio', claimed: size(0.1), level: percent(99) },
  ],
  [
    'need KELP 5bp at 95%',
    {
      verb: 'need',
      ticker: 'KELP',
      ...sample(60, false),
      size: size(0.0005),
      level: percent(95),
      power: { digits: 8, places: 1 },
    },
  ],
  [
    'need KELP 10% a year power 90%',
    {
      verb: 'need',
      ticker: 'KELP',
      ...sample(60, false),
      size: size(0.1, 'year'),
      level: percent(95),
      power: { digits: 9, places: 1 },
    },
  ],
  [
    'compare KELP TARN 60d',
    { verb: 'compare', ...sample(60), level: percent(95), between: 'tickers', tickers: ['KELP', 'TARN'] },
  ],
  [
    'compare TARN vs KELP',
    {
      verb: 'compare',
      ...sample(60, false),
      level: percent(95),
      between: 'tickers',
      tickers: ['TARN', 'KELP'],
    },
  ],
  [
    'compare KELP before 2026-05-04',
    {
      verb: 'compare',
      ...allDefault,
      level: percent(95),
      between: 'periods',
      ticker: 'KELP',
      splitDay: dayOf('2026-05-04'),
    },
  ],
  [
    'backtest KELP 250d at 99%',
    {
      verb: 'backtest',
      ticker: 'KELP',
      ...sample(250),
      tailLevel: percent(99),
      estimationReturns: 250,
      model: null,
    },
  ],
  [
    'backtest KELP on window 500d by filtered',
    {
      verb: 'backtest',
      ticker: 'KELP',
      ...sample(500, false),
      tailLevel: percent(99),
      estimationReturns: 500,
      model: 'filtered',
    },
  ],
  ['feed', { verb: 'feed', ticker: null }],
  ['feed KELP', { verb: 'feed', ticker: 'KELP' }],
  ['help', { verb: 'help', topic: null }],
  ['help tail', { verb: 'help', topic: 'tail' }],
  ['help VaR', { verb: 'help', topic: 'tail' }],
  ['help live prices', { verb: 'help', topic: 'prices' }],
  ['help help', { verb: 'help', topic: 'help' }],
];

test.each(questions)('%s', (text, question) => {
  expect(questionIn(text).question).toEqual(question);
});

test.each([
  ['interval KELP', ['60d (default)', '95% (default)']],
  ['interval KELP 20d at 90%', []],
  ['tail KELP', ['500d (default)', '99% (default)', 'over 1d (default)', 'confidence 95% (default)']],
  ['tail KELP beyond 4%', ['500d (default)', 'confidence 95% (default)']],
  ['shape KELP', ['500d (default)', 'confidence 95% (default)']],
  ['claim KELP 20bp', ['60d (default)', '95% (default)']],
  ['need KELP 5bp', ['60d (default)', '95% (default)', 'power 80% (default)']],
  ['compare KELP TARN', ['60d (default)', '95% (default)']],
  ['compare KELP before 2026-05-04', ['all (default)', '95% (default)']],
  ['backtest KELP', ['500d (default)', '99% (default)', 'on window 250d (default)']],
  ['vol KELP 60d 95%', ['vol read as interval vol']],
  ['VaR of KELP 500d 99% over 1d confidence 95%', ['VaR read as tail']],
  ['ES KELP 500d 99% over 1d confidence 95%', ['ES read as tail']],
  ['tail VaR and ES of KELP 500d 99% over 1d confidence 95%', []],
  ['interval KELP since 4 May at 95%', ['4 May read as 2026-05-04']],
  ['feed', []],
])('%s says what it took for granted', (text, assumed) => {
  expect(questionIn(text).assumed).toEqual(assumed);
});

test('the defaults are the configured ones', () => {
  const { defaults } = context;
  const desk = {
    ...context,
    defaults: {
      ...defaults,
      interval: { window: { kind: 'span', amount: 1, unit: 'year' }, level: percent(90) },
      tail: { ...defaults.tail, horizonDays: 10 },
    } as const,
  };
  expect(questionIn('interval KELP', desk).assumed).toEqual(['1y (default)', '90% (default)']);
  expect(questionIn('tail KELP', desk).question).toMatchObject({ horizonDays: 10 });
  expect(questionIn('tail KELP beyond 4%', desk).question).toMatchObject({ horizonDays: 1 });
});

test.each([
  ['KELP 60d interval', 'interval KELP 60d at 95%'],
  ['INTERVAL kelp 60D AT 95%', 'interval KELP 60d at 95%'],
  ['95% kelp Interval 60 Days', 'interval KELP 60d at 95%'],
  ["what's the vol of KELP?", 'interval vol KELP 60d at 95%'],
  ['please vol KELP', 'interval vol KELP 60d at 95%'],
  ['what’s the VaR and ES of KELP', 'tail KELP 500d at 99% confidence 95% over 1d'],
  ['tail KELP tail', 'tail KELP 500d at 99% confidence 95% over 1d'],
  ['at 99% the tail for TARN', 'tail TARN 500d at 99% confidence 95% over 1d'],
  ['shape KELP at 90%', 'shape KELP 500d confidence 90%'],
  ['shape KELP confidence 90%', 'shape KELP 500d confidence 90%'],
  ['compare KELP after 4 May', 'compare KELP before 2026-05-04 all at 95%'],
  ['compare KELP before and after 2026-05-04 2y', 'compare KELP before 2026-05-04 2y at 95%'],
])('%s is %s', (text, canonical) => {
  expect(canonicalsOf(text)).toEqual([canonical]);
});

test('KELP vol without a verb is refused, since vol does not lead', () => {
  expect(problemIn('KELP vol').code).toBe('noVerb');
});

test.each([
  ['interval tail KELP', ['interval KELP 60d at 95%', 'tail KELP 500d at 99% confidence 95% over 1d']],
  ['tail help', ['help tail', 'help']],
  // the feed has a ticker ES, so it may be meant
  ['interval ES 60d', ['interval `ES` 60d at 95%']],
])('%s holds two verbs', (text, suggestions) => {
  const problem = problemIn(text);
  expect(problem.code).toBe('severalVerbs');
  expect(problem.suggestions).toEqual(suggestions);
});

test.each(['book', 'help book'])('%s cannot be asked yet', (text) => {
  const problem = problemIn(text);
  expect(problem.code).toBe('verbNotBuilt');
  expect(problem.message).toContain('interval, tail');
  expect(problem.suggestion).not.toBe(null);
});

test('a verb that can be read but not answered is refused with one that can', () => {
  const problem = problemIn('tail KELP at 99%', { ...context, builtVerbs: ['interval', 'help'] });
  expect(problem.code).toBe('verbNotBuilt');
  expect(problem.suggestion).toBe('interval KELP 60d at 95%');
});
