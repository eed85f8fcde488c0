/** The answer as data: every documented key of every verb is there, with nothing that JSON cannot hold. */
import { beforeAll, describe, expect, test } from 'vitest';
import type { Answer } from '../../src/answers/answer.ts';
import { answersToJson } from '../../src/present/json.ts';
import type { Converse } from '../../src/workspaces/converse.ts';
import { demoConverse } from './demoDesk.ts';

const words = (text: string): readonly string[] => text.trim().split(/\s+/);

const envelope =
  words(`schemaVersion methodVersion id verb question assumed subject asOf window returnCount returnType droppedDates
  longestGapDays currency quoteUnit priceAdjustment periodsPerYear seed dataFingerprint figures warnings notes method sources working`);

const figures: readonly (readonly [string, readonly string[]])[] = [
  [
    'interval KELP 60d',
    words(`mean sampleStandardDeviation standardError degreesOfFreedom confidenceLevel side criticalT lower upper normalLower
      normalUpper predictionLower predictionUpper annualMean annualLower annualUpper lag1Autocorrelation ljungBoxQ ljungBoxP
      ljungBoxLags robustQ robustQP neweyWestLower neweyWestUpper bootstrapMethod bootstrapLower bootstrapUpper skewness
      excessKurtosis ladder widths trust`),
  ],
  [
    'interval vol KELP 60d',
    words(`sampleStandardDeviation confidenceLevel lower upper bonettLower bonettUpper blockLower blockUpper excessKurtosis
      annualDeviation annualDeviationLower annualDeviationUpper trust`),
  ],
  ['interval ratio KELP 60d', words('ratio annualRatio confidenceLevel lower upper annualLower annualUpper')],
  [
    'claim KELP 20bp',
    words(
      'of estimate claimed t p degreesOfFreedom verdict detectableAt80 returnsNeeded confidenceLevel lower upper',
    ),
  ],
  [
    'claim ratio KELP 1.2 a year 2y',
    words(
      'of estimate claimed t p degreesOfFreedom verdict detectableAt80 returnsNeeded confidenceLevel lower upper',
    ),
  ],
  [
    'need KELP 5bp',
    words(
      'halfWidth halfWidthReturns detect detectReturns power confidenceLevel sampleStandardDeviation yearsNeeded',
    ),
  ],
  [
    'compare KELP TARN',
    words(`kind order difference lower upper t p degreesOfFreedom confidenceLevel spreadTest spreadStatistic spreadP deviationRatio
      ratioLower ratioUpper holmP holmSpreadP`),
  ],
  ['tail KELP on 2m USD', words('tailLevel confidenceLevel horizonDays amount models')],
  ['tail KELP beyond 4%', words('threshold models days')],
  [
    'shape KELP',
    words(`skewness excessKurtosis jarqueBera jarqueBeraP jarqueBeraSimulatedP andersonDarlingNormal andersonDarlingNormalP
      andersonDarlingStudent andersonDarlingStudentP likelihoodRatio likelihoodRatioP nu nuLower nuUpper normalLimit tailMultiples`),
  ],
  ['backtest KELP at 97.5%', words('tailLevel days window models')],
];

const modelKeys = {
  tail: words(`model ok var varLower varUpper varIntervalMethod varAttainedLevel es esLower esUpper esIntervalMethod target
    measuredCoverage monteCarloError varMoney esMoney parameters`),
  beyond: words('model ok probability lower upper meanReturnSessions'),
  backtest:
    words(`model ok exceedances expected exceedanceDates coverageLR coverageP binomialP independenceLR independenceP
    independenceExactP conditionalLR conditionalP zone esZ2 esP meanQuantileLoss meanJointLoss dieboldMarianoP`),
} as const;

const parameterKeys: Readonly<Record<string, readonly string[]>> = {
  normal: words('mean sampleStandardDeviation'),
  student: words('location scale nu nuLower nuUpper normalLimit logLikelihood'),
  filtered: words('kind nextDayDeviation'),
  peaks: words('threshold exceedances shape shapeLower shapeUpper scale'),
};

/** JSON writes NaN and infinities as null without a word: none may be left anywhere. */
const notWritable = (value: unknown, path = ''): readonly string[] => {
  if (typeof value === 'number') return Number.isFinite(value) ? [] : [`${path} is ${value}`];
  if (typeof value !== 'object' || value === null) return value === undefined ? [`${path} is undefined`] : [];
  return Object.entries(value).flatMap(([key, each]) => notWritable(each, `${path}.${key}`));
};

const missing = (value: object, keys: readonly string[]): readonly string[] =>
  keys.filter((key) => !(key in value));

describe('every documented key', () => {
  let converse: Converse;
  beforeAll(async () => {
    converse = await demoConverse();
  });

  const answersTo = async (text: string): Promise<readonly Answer[]> => {
    const spoken = await converse.ask({ text, place: 'terminal' });
    return spoken.flatMap(({ outcome }) => {
      if (outcome?.ok !== true) throw new Error(`${text} was refused`);
      return outcome.value;
    });
  };

  test.each(figures)('%s', async (question, keys) => {
    const [answer] = await answersTo(question);
    if (answer === undefined) throw new Error('no answer');
    expect(missing(answer, envelope)).toEqual([]);
    expect(missing(answer.figures, keys)).toEqual([]);
    expect(notWritable(answer)).toEqual([]);
    expect(answer.question.split(' ')[0]).toBe(answer.verb);
    expect(JSON.parse(answersToJson([answer])).answer.text).toContain(answer.id);
  });

  test('each tail model has its keys and its parameters', async () => {
    const [answer] = await answersTo('tail KELP on 500 shares');
    if (answer?.kind !== 'tail') throw new Error('no tail answer');
    expect(new Set(answer.figures.models.map(({ model }) => model))).toEqual(
      new Set(['historical', 'normal', 'student', 'filtered', 'peaks']),
    );
    for (const model of answer.figures.models) {
      if (!model.ok) throw new Error(`${model.model} was refused`);
      expect(missing(model, modelKeys.tail)).toEqual([]);
      expect(missing(model.parameters, parameterKeys[model.model] ?? [])).toEqual([]);
    }
  });

  test('a refused model stands beside the others with its problem and what would be enough', async () => {
    const [answer] = await answersTo('tail KELP 60d at 99%');
    if (answer?.kind !== 'tail') throw new Error('no tail answer');
    const refused = answer.figures.models.flatMap((model) =>
      model.ok ? [] : [[model.model, model.problem.code, model.problem.needs]],
    );
    expect(refused).toEqual([
      ['historical', 'notEnoughTail', 100],
      ['filtered', 'notEnoughTail', 100],
      ['peaks', 'tooFewReturns', 250],
    ]);
    expect(answer.figures.models.filter(({ ok }) => ok)).toHaveLength(2);
  });

  test('beyond and backtest give the keys of their models', async () => {
    const [beyond, backtest] = [
      ...(await answersTo('tail KELP beyond 3%')),
      ...(await answersTo('backtest KELP at 97.5%')),
    ];
    if (beyond?.kind !== 'tail beyond' || backtest?.kind !== 'backtest') throw new Error('other answers');
    for (const model of beyond.figures.models)
      if (model.ok) expect(missing(model, modelKeys.beyond)).toEqual([]);
    for (const model of backtest.figures.models)
      if (model.ok) expect(missing(model, modelKeys.backtest)).toEqual([]);
    expect(backtest.figures.models.filter(({ ok }) => ok).length).toBeGreaterThan(3);
  });

  test('a short position uses the other tail, and its money is the amount times its own figure', async () => {
    const [long] = await answersTo('tail KELP on 1000 USD by historical');
    const [short] = await answersTo('tail KELP on -1000 USD by historical');
    if (long?.kind !== 'tail' || short?.kind !== 'tail') throw new Error('no tail answers');
    const [first, second] = [long.figures.models[0], short.figures.models[0]];
    if (first?.ok !== true || second?.ok !== true) throw new Error('refused');
    expect([long.figures.position, short.figures.position]).toEqual(['long', 'short']);
    expect(first.var).not.toBe(second.var);
    expect(first.varMoney).toBeCloseTo(1000 * first.var, 9);
    expect(second.varMoney).toBeCloseTo(1000 * second.var, 9);
  });

  test('three tickers are compared pair by pair, with p-values adjusted', async () => {
    const answers = await answersTo('compare KELP TARN WRACK');
    expect(answers.map(({ subject }) => subject)).toEqual([
      ['KELP', 'TARN'],
      ['KELP', 'WRACK'],
      ['TARN', 'WRACK'],
    ]);
    for (const answer of answers) {
      if (answer.kind !== 'compare') throw new Error('no comparison');
      expect(answer.figures.holmP).toBeGreaterThanOrEqual(answer.figures.p);
    }
    expect(answers.some(({ warnings }) => warnings.some(({ code }) => code === 'differentCurrencies'))).toBe(
      true,
    );
  });

  test('a ticker’s prices come with a picture where it is asked for, and with what stands for it in text', async () => {
    const pictures = async (text: string) =>
      (await converse.ask({ text, place: 'terminal' })).flatMap((spoken) => spoken.pictures ?? []);
    const [picture, ...others] = await pictures('feed KELP as picture');
    expect(picture?.inText.map(({ head }) => head)).toEqual(['Closes, oldest first']);
    expect(picture?.altText).toContain('KELP');
    expect(others).toEqual([]);
    expect(await pictures('feed KELP')).toEqual([]);
  });

  test.each([
    ['tail KELP on 2m EUR', 'currencyMismatch'],
    ['backtest KELP 700d', 'windowTooLong'],
    ['compare KELP before 2023-11-28', 'tooFewReturns'],
    ['tail DULSE 10d by peaks', 'tooFewReturns'],
  ])('%s is refused with %s', async (text, code) => {
    const [spoken] = await converse.ask({ text, place: 'terminal' });
    expect(spoken?.outcome?.ok === false ? spoken.outcome.problem.code : 'answered').toBe(code);
  });
});
