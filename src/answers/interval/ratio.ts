import type { IntervalQuestion } from '../../questions/question.ts';
import { annualRatio } from '../../stats/mean/annual.ts';
import { meanEvidence } from '../../stats/mean/evidence.ts';
import { ratioInterval } from '../../stats/ratio/interval.ts';
import { levelFraction, levelText } from '../../terms/level.ts';
import { type Result, succeed } from '../../terms/result.ts';
import { workingDigits } from '../../wording/digits.ts';
import { probabilityValue } from '../../wording/words.ts';
import type { RatioAnswer, Warning } from '../answer.ts';
import { type Asked, enclose } from '../envelope.ts';
import { coverageWarnings } from '../measured.ts';
import { endsText, returnsStep } from '../working.ts';
import type { RatioFigures } from './figures.ts';

const sources = [
  'Interval by inverting the noncentral t distribution: Steiger & Fouladi (1997)',
  'Annual figures: trade practice, without a source; √ of the days needs returns without autocorrelation (Lo 2002)',
] as const;

const warningsFor = (returns: ArrayLike<number>): readonly Warning[] => {
  const evidence = meanEvidence(returns);
  return evidence.dependent
    ? [
        {
          code: 'dependence',
          text: `returns follow each other (robust test p ${probabilityValue(evidence.robustAutocorrelation?.p ?? 1)}), and neither this interval nor the annual figure allows for that: take both as rough.`,
        },
      ]
    : [];
};

/** Where the true ratio of mean to standard deviation can lie. */
export const answerRatio = (asked: Asked, question: IntervalQuestion): Result<RatioAnswer> => {
  const { sample, policy } = asked;
  const found = ratioInterval(sample.returns, question.level);
  if (!found.ok) return found;
  const { ratio, lower, upper, degreesOfFreedom } = found.value;
  const yearly = (value: number) => annualRatio(value, policy.periodsPerYear);
  const figures: RatioFigures = {
    ratio,
    annualRatio: yearly(ratio),
    confidenceLevel: levelFraction(question.level),
    lower,
    upper,
    annualLower: yearly(lower),
    annualUpper: yearly(upper),
  };
  const root = workingDigits(Math.sqrt(sample.returns.length));
  return succeed(
    enclose(asked, {
      kind: 'interval ratio',
      verb: 'interval',
      figures,
      warnings: [
        ...warningsFor(sample.returns),
        ...coverageWarnings(
          'ratio.noncentralT',
          'this interval of the ratio',
          sample.returns,
          question.level,
        ),
      ],
      notes: [
        { figure: 'ratio', code: 'nothingDeducted', text: 'Nothing risk-free is deducted from the mean.' },
      ],
      method: 'noncentral t interval of the ratio',
      sources,
      working: [
        returnsStep(sample, asked.returnType),
        {
          step: 'Ratio',
          text: `mean / s = ${workingDigits(ratio)} a day; times √${policy.periodsPerYear} = ${workingDigits(figures.annualRatio)} a year`,
        },
        {
          step: 'Interval',
          text: `the ratios δ/√n for which √n·ratio = ${root} · ${workingDigits(ratio)} is not extreme under the noncentral t with ${degreesOfFreedom} degrees of freedom, ${levelText(question.level)}: ${endsText({ lower, upper })}`,
        },
      ],
    }),
  );
};
