import type { NeedQuestion, ReadQuestion } from '../../questions/question.ts';
import { type Need, need } from '../../stats/samples/need.ts';
import { levelFraction, levelText } from '../../terms/level.ts';
import type { PriceSeries } from '../../terms/prices.ts';
import { type Result, succeed } from '../../terms/result.ts';
import { digits, threeDigits, workingDigits } from '../../wording/digits.ts';
import type { NeedAnswer, Warning } from '../answer.ts';
import { askOne } from '../askOne.ts';
import { enclose } from '../envelope.ts';
import type { AnswerPolicy } from '../policy.ts';
import { endsText, returnsStep } from '../working.ts';
import type { NeedFigures } from './figures.ts';

const warningsFor = ({ dependenceFactor, forDetection }: Need, returnCount: number): readonly Warning[] => [
  ...(dependenceFactor > 1
    ? [
        {
          code: 'dependenceFactor',
          text: `the standard error that allows for dependence (Newey–West) is the larger one, so all counts are multiplied by ${threeDigits(dependenceFactor)}.`,
        },
      ]
    : []),
  ...(forDetection.upper > 2 * forDetection.lower
    ? [
        {
          code: 'deviationUnsure',
          text: `the standard deviation of ${digits(returnCount, 0)} returns is itself unsure, and the count moves with its square: read the range, not the one number.`,
        },
      ]
    : []),
];

const range = ({ returns, lower, upper }: Need['forDetection']): string =>
  `${digits(returns, 0)} (${digits(lower, 0)} to ${digits(upper, 0)} at the ends of the standard deviation’s interval)`;

/** How many days until one could tell? */
export const answerNeed = (
  read: ReadQuestion,
  question: NeedQuestion,
  series: PriceSeries,
  policy: AnswerPolicy,
): Result<NeedAnswer> => {
  const asked = askOne(read, question, series, policy);
  if (!asked.ok) return asked;
  const { sample } = asked.value;
  const { periodsPerYear } = policy;
  const { level, power } = question;
  const size = question.size.per === 'day' ? question.size.fraction : question.size.fraction / periodsPerYear;
  const found = need({ returns: sample.returns, size, level, power, periodsPerYear });
  if (!found.ok) return found;
  const needed = found.value;
  const figures: NeedFigures = {
    halfWidth: size,
    halfWidthReturns: needed.forHalfWidth.returns,
    halfWidthReturnsLower: needed.forHalfWidth.lower,
    halfWidthReturnsUpper: needed.forHalfWidth.upper,
    detect: size,
    detectReturns: needed.forDetection.returns,
    detectReturnsLower: needed.forDetection.lower,
    detectReturnsUpper: needed.forDetection.upper,
    power: levelFraction(power),
    confidenceLevel: levelFraction(level),
    sampleStandardDeviation: needed.sampleStandardDeviation,
    yearsNeeded: needed.detectionYears,
    halfWidthYears: needed.halfWidthYears,
    dependenceFactor: needed.dependenceFactor,
  };
  return succeed(
    enclose(asked.value, {
      kind: 'need',
      verb: 'need',
      figures,
      warnings: warningsFor(needed, sample.returns.length),
      notes: [],
      method: 'sample size by Student’s t and the noncentral t',
      sources: [
        'Student (1908), Biometrika 6',
        'Power: noncentral t distribution, both tails',
        'Newey & West (1987), Econometrica 55',
      ],
      working: [
        returnsStep(sample, asked.value.returnType),
        {
          step: 'Standard deviation',
          text: `s = ${workingDigits(needed.sampleStandardDeviation)}, at ${levelText(level)} ${endsText({ lower: needed.deviationLower, upper: needed.deviationUpper })}`,
        },
        {
          step: 'Dependence',
          text: `(Newey–West / plain standard error)², at least 1: ${workingDigits(needed.dependenceFactor)}`,
        },
        {
          step: 'Until the interval is ± that size',
          text: `smallest n with t·s/√n ≤ ${workingDigits(size)}: ${range(needed.forHalfWidth)}`,
        },
        {
          step: 'Until it is told from zero',
          text: `smallest n with ${levelText(power)} power at ${levelText(level)}: ${range(needed.forDetection)}`,
        },
        {
          step: 'Years',
          text: `${digits(needed.forDetection.returns, 0)} / ${periodsPerYear} = ${workingDigits(needed.detectionYears)}`,
        },
      ],
    }),
  );
};
