import { historicalTail } from '../../stats/tails/historicalTail.ts';
import type { TailInput } from '../../stats/tails/tailFigures.ts';
import { isoFromDay } from '../../terms/day.ts';
import { type Level, levelFraction } from '../../terms/level.ts';
import type { PriceMeaning } from '../../terms/prices.ts';
import { percent } from '../../wording/percent.ts';
import type { Warning } from '../answer.ts';
import { coverageWarnings } from '../measured.ts';
import type { ReturnSample } from '../sample.ts';
import type { RefusedModel, TailModelFigures } from './figures.ts';

/** The next day’s figure and the long run’s differ by more than this share of the latter. */
const clusteringShows = 1 / 3;
/** The largest loss carries the figure where taking it out changes the expected shortfall by more than this share. */
const carriedShare = 1 / 4;

type Figures = readonly (TailModelFigures | RefusedModel)[];

const named = (models: Figures, name: string): TailModelFigures | null =>
  models.find((each): each is TailModelFigures => each.ok && each.model === name) ?? null;

export const adjustmentWarnings = ({ priceAdjustment }: PriceMeaning): readonly Warning[] => {
  if (priceAdjustment === 'unknown')
    return [
      {
        code: 'adjustmentUnknown',
        text: 'it is not stated whether the closes are adjusted, and an unadjusted split or dividend would look like a loss: state feed.prices.priceAdjustment.',
      },
    ];
  return priceAdjustment === 'none'
    ? [
        {
          code: 'notAdjusted',
          text: 'the closes are not adjusted, so a split or a dividend in the window looks like a loss: check the largest ones.',
        },
      ]
    : [];
};

const clusteringWarning = (models: Figures): readonly Warning[] => {
  const student = named(models, 'student');
  const filtered = named(models, 'filtered');
  if (student === null || filtered === null) return [];
  if (Math.abs(filtered.var - student.var) <= clusteringShows * Math.abs(student.var)) return [];
  const now = filtered.var > student.var ? 'stormier' : 'calmer';
  return [
    {
      code: 'volatilityClusters',
      text: `the market is ${now} now than over the window: for the next day filtered says ${percent(filtered.var)} where student says ${percent(student.var)}. For tomorrow read filtered.`,
    },
  ];
};

/** Without the largest loss the rest must say much the same; else one day speaks for all. */
const outlierWarning = ({ days }: ReturnSample, input: TailInput): readonly Warning[] => {
  const { returns } = input;
  const worst = returns.indexOf(returns.reduce((least, value) => Math.min(least, value)));
  const rest = Float64Array.from([...returns.subarray(0, worst), ...returns.subarray(worst + 1)]);
  // The figures alone are compared, so no resample is made for their intervals.
  const plain = { ...input, replicates: 0 };
  const whole = historicalTail(plain);
  const without = historicalTail({ ...plain, returns: rest });
  if (!whole.ok || !without.ok || whole.value.es === null || without.value.es === null) return [];
  const change = Math.abs(whole.value.es - without.value.es);
  if (change <= carriedShare * Math.abs(whole.value.es)) return [];
  const day = isoFromDay(days[worst + 1] as number);
  return [
    {
      code: 'outlierCarries',
      text: `one day, ${day} (${percent(returns[worst] as number)}), carries the result: without it the historical ES is ${percent(without.value.es)} instead of ${percent(whole.value.es)}. Check that price.`,
    },
  ];
};

const nuWarning = (models: Figures): readonly Warning[] => {
  const nuLower = named(models, 'student')?.parameters['nuLower'];
  return typeof nuLower === 'number' && nuLower <= 2
    ? [
        {
          code: 'varianceMayNotBeFinite',
          text: 'the tail may be so heavy that no variance exists (degrees of freedom of 2 are not ruled out): volatility figures of this ticker mean little.',
        },
      ]
    : [];
};

const wideWarning = (leading: TailModelFigures | null): readonly Warning[] => {
  if (leading === null || leading.varLower === null || leading.varUpper === null) return [];
  return leading.varUpper - leading.varLower > Math.abs(leading.var)
    ? [
        {
          code: 'widerThanFigure',
          text: `the interval around the ${leading.model} VaR is wider than the figure itself: so few days cannot size it. Ask for a longer window or a lower level.`,
        },
      ]
    : [];
};

export type Warned = {
  readonly models: Figures;
  readonly leading: TailModelFigures | null;
  readonly sample: ReturnSample;
  readonly input: TailInput;
  readonly meaning: PriceMeaning;
  readonly confidence: Level;
  /** Coverage is measured for figures of one day. */
  readonly oneDay: boolean;
};

/** The warnings of a tail answer, those that can change its figure first. */
export const tailWarnings = ({
  models,
  leading,
  sample,
  input,
  meaning,
  confidence,
  oneDay,
}: Warned): readonly Warning[] => [
  ...clusteringWarning(models),
  ...outlierWarning(sample, input),
  ...wideWarning(leading),
  ...(leading === null || !oneDay
    ? []
    : coverageWarnings(
        `tail.${leading.model}.var.${levelFraction(input.tailLevel)}`,
        `this interval of the ${leading.model} VaR`,
        input.returns,
        confidence,
      )),
  ...nuWarning(models),
  ...adjustmentWarnings(meaning),
];
