import type { AdjustedP, Comparison } from '../../stats/comparisons/compare.ts';
import { sampleStandardDeviation } from '../../stats/moments/deviation.ts';
import { arithmeticMean } from '../../stats/moments/mean.ts';
import { type Level, levelFraction, levelText, tailFraction } from '../../terms/level.ts';
import type { ReturnType } from '../../terms/returns.ts';
import { workingDigits } from '../../wording/digits.ts';
import { probabilityValue } from '../../wording/words.ts';
import type { Note, Warning, WorkingStep } from '../answer.ts';
import type { OwnParts } from '../envelope.ts';
import type { ReturnSample } from '../sample.ts';
import { endsText, returnsStep } from '../working.ts';
import { comparisonCoverage } from './coverage.ts';
import type { CompareFigures } from './figures.ts';

export type Compared = {
  readonly comparison: Comparison;
  readonly first: ReturnSample;
  readonly second: ReturnSample;
  readonly order: readonly [string, string];
  readonly level: Level;
  readonly returnType: ReturnType;
  readonly adjusted: AdjustedP | null;
  readonly warnings: readonly Warning[];
};

const sources = [
  'Student (1908), Biometrika 6 (paired); Welch (1947), Biometrika 34 with Satterthwaite (1946) (two periods)',
  'Spread: Brown & Forsythe (1974), Journal of the American Statistical Association 69',
  'Ratio of deviations: BCa, Efron (1987); stationary blocks, Politis & Romano (1994)',
  'Several pairs: Holm (1979), Scandinavian Journal of Statistics 6',
] as const;

const ratioExcludesOne = (ratio: Comparison['ratio']): boolean =>
  ratio !== null && (ratio.lower > 1 || ratio.upper < 1);

const figuresOf = ({ comparison, first, second, order, level, adjusted }: Compared): CompareFigures => {
  const { mean, spread, ratio } = comparison;
  return {
    kind: comparison.kind,
    order,
    firstMean: arithmeticMean(first.returns),
    secondMean: arithmeticMean(second.returns),
    difference: mean.difference,
    lower: mean.lower,
    upper: mean.upper,
    t: mean.t,
    p: mean.p,
    degreesOfFreedom: mean.degreesOfFreedom,
    confidenceLevel: levelFraction(level),
    spreadTest: comparison.spreadTest,
    spreadStatistic: spread?.statistic ?? null,
    spreadP: spread?.p ?? null,
    firstDeviation: sampleStandardDeviation(first.returns),
    secondDeviation: sampleStandardDeviation(second.returns),
    deviationRatio: ratio?.ratio ?? null,
    ratioLower: ratio?.lower ?? null,
    ratioUpper: ratio?.upper ?? null,
    ratioMethod: ratio?.method ?? null,
    meansDiffer: (adjusted?.mean ?? mean.p) < tailFraction(level),
    spreadsDiffer: adjusted === null ? ratioExcludesOne(ratio) : (adjusted.spread ?? 1) < tailFraction(level),
    holmP: adjusted?.mean ?? null,
    holmSpreadP: adjusted?.spread ?? null,
  };
};

const notesOf = ({ comparison, adjusted }: Compared): readonly Note[] => [
  ...(comparison.ratioProblem === null
    ? []
    : [
        {
          figure: 'deviationRatio',
          code: comparison.ratioProblem.code,
          text: comparison.ratioProblem.message,
        },
      ]),
  ...(comparison.spread === null
    ? [
        {
          figure: 'spreadP',
          code: 'noSpread',
          text: 'The distances from the median do not vary enough for a test of spread.',
        },
      ]
    : []),
  ...(adjusted === null
    ? [
        {
          figure: 'holmP',
          code: 'onePair',
          text: 'Only one pair was compared, so no p-value needs adjusting.',
        },
      ]
    : []),
];

const stepsOf = ({
  comparison,
  first,
  second,
  order,
  level,
  returnType,
  adjusted,
}: Compared): readonly WorkingStep[] => {
  const { mean, spread, ratio, kind } = comparison;
  const degrees = workingDigits(mean.degreesOfFreedom);
  return [
    { ...returnsStep(first, returnType), step: `Returns, ${order[0]}` },
    { ...returnsStep(second, returnType), step: `Returns, ${order[1]}` },
    {
      step: kind === 'paired' ? 'Paired t' : 'Welch’s t',
      text: `difference ${workingDigits(mean.difference)} / standard error ${workingDigits(mean.standardError)} = ${workingDigits(mean.t)}, ${degrees} degrees of freedom, p ${probabilityValue(mean.p)}; ${levelText(level)}: ${endsText(mean)}`,
    },
    ...(spread === null
      ? []
      : [
          {
            step: kind === 'paired' ? 'Spread, paired distances from the medians' : 'Spread, Brown–Forsythe',
            text: `statistic ${workingDigits(spread.statistic)}, p ${probabilityValue(spread.p)}`,
          },
        ]),
    ...(ratio === null
      ? []
      : [
          {
            step: 'Ratio of standard deviations',
            text: `${workingDigits(ratio.ratio)}, ${ratio.method === 'bca' ? 'BCa' : 'stationary blocks'}, 9,999 resamples: ${endsText(ratio)}`,
          },
        ]),
    ...(adjusted === null
      ? []
      : [
          {
            step: 'Adjusted for all pairs (Holm)',
            text: `mean p ${probabilityValue(adjusted.mean ?? 1)}, spread p ${adjusted.spread === null ? 'not tested' : probabilityValue(adjusted.spread)}`,
          },
        ]),
  ];
};

/** The verb’s own parts of a comparison, of two tickers or of two periods. */
export const comparisonParts = (compared: Compared): OwnParts<'compare', 'compare', CompareFigures> => ({
  kind: 'compare',
  verb: 'compare',
  figures: figuresOf(compared),
  warnings: [
    ...comparisonCoverage(compared.comparison, compared.first, compared.second, compared.level),
    ...compared.warnings,
  ],
  notes: notesOf(compared),
  method:
    compared.comparison.kind === 'paired' ? 'paired t test on common dates' : 'Welch’s t test of two periods',
  sources,
  working: stepsOf(compared),
});
