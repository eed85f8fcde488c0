import type { ClaimQuestion, ReadQuestion } from '../../questions/question.ts';
import { type ClaimOnMean, claimOnMean } from '../../stats/claims/claimOnMean.ts';
import { claimOnRatio } from '../../stats/claims/claimOnRatio.ts';
import { levelFraction, levelText } from '../../terms/level.ts';
import type { PriceSeries } from '../../terms/prices.ts';
import { type Result, succeed } from '../../terms/result.ts';
import { workingDigits } from '../../wording/digits.ts';
import { counted, probabilityValue } from '../../wording/words.ts';
import type { ClaimAnswer, Warning, WorkingStep } from '../answer.ts';
import { askOne } from '../askOne.ts';
import { type Asked, enclose } from '../envelope.ts';
import { coverageWarnings } from '../measured.ts';
import type { AnswerPolicy } from '../policy.ts';
import { endsText, returnsStep } from '../working.ts';
import type { ClaimFigures } from './figures.ts';

/** A yearly mean is divided by the days of a year, a yearly ratio by their root. */
const perDay = ({ of, claimed }: ClaimQuestion, periodsPerYear: number): number => {
  if (claimed.per === 'day') return claimed.fraction;
  return claimed.fraction / (of === 'ratio' ? Math.sqrt(periodsPerYear) : periodsPerYear);
};

const divisionStep = (question: ClaimQuestion, claimed: number, periodsPerYear: number): WorkingStep[] =>
  question.claimed.per === 'day'
    ? []
    : [
        {
          step: 'Claim a day',
          text: `${workingDigits(question.claimed.fraction)} a year / ${question.of === 'ratio' ? '√' : ''}${periodsPerYear} = ${workingDigits(claimed)}`,
        },
      ];

const verdictRule =
  'contradicted where the claim lies outside the interval; cannot tell where the claim and zero both lie inside; else consistent';

const countStep = (returnsNeeded: number | null, detectableAt80: number): WorkingStep => ({
  step: 'How much could be told',
  text:
    `smallest distance from the claim found with 80% power: ${workingDigits(detectableAt80)}` +
    (returnsNeeded === null
      ? ''
      : `; to tell the claim from zero with 80% power: ${counted(returnsNeeded, 'return')}`),
});

const dependenceWarnings = ({ decidedBy, robustQP }: ClaimOnMean): readonly Warning[] =>
  decidedBy === 'neweyWest' && robustQP < 0.05
    ? [
        {
          code: 'dependence',
          text: `returns follow each other (robust test p ${probabilityValue(robustQP)}), so the Newey–West standard error decides instead of the plain one.`,
        },
      ]
    : [];

const answerOnMean = (asked: Asked, question: ClaimQuestion): Result<ClaimAnswer> => {
  const { sample, policy } = asked;
  const claimed = perDay(question, policy.periodsPerYear);
  const { level, side, robust } = question;
  const { smallestMeanThatMatters } = policy;
  const found = claimOnMean({
    returns: sample.returns,
    claimed,
    level,
    side,
    robust,
    smallestMeanThatMatters,
  });
  if (!found.ok) return found;
  const claim = found.value;
  const figures: ClaimFigures = {
    of: 'mean',
    estimate: claim.estimate,
    claimed,
    claimedPer: question.claimed.per,
    side,
    t: claim.t,
    p: claim.p,
    degreesOfFreedom: claim.degreesOfFreedom,
    verdict: claim.verdict,
    decidedBy: claim.decidedBy,
    detectableAt80: claim.detectableAt80,
    returnsNeeded: claim.returnsNeeded,
    confidenceLevel: levelFraction(level),
    lower: claim.lower,
    upper: claim.upper,
  };
  return succeed(
    enclose(asked, {
      kind: 'claim',
      verb: 'claim',
      figures,
      warnings: [
        ...dependenceWarnings(claim),
        // The interval of a claim is that of the mean, by the standard error that decides.
        ...coverageWarnings(`mean.${claim.decidedBy}`, 'this interval of the mean', sample.returns, level),
      ],
      notes: claim.returnsNeeded === null ? [zeroClaimNote] : [],
      method: claim.decidedBy === 'plain' ? 'one-sample t test' : 't test with the Newey–West standard error',
      sources: [
        'Student (1908), Biometrika 6',
        'Newey & West (1987), Econometrica 55',
        'Power: noncentral t distribution',
      ],
      working: [
        returnsStep(sample, asked.returnType),
        ...divisionStep(question, claimed, policy.periodsPerYear),
        {
          step: 'Distance from the claim',
          text: `t = (mean − claim) / standard error = (${workingDigits(claim.estimate)} − ${workingDigits(claimed)}) / ${workingDigits(claim.standardError)} = ${workingDigits(claim.t)}; ${claim.degreesOfFreedom} degrees of freedom, p ${probabilityValue(claim.p)}`,
        },
        { step: 'Interval', text: `${levelText(level)}: ${endsText(claim)}` },
        countStep(claim.returnsNeeded, claim.detectableAt80),
        { step: 'Verdict', text: `${claim.verdict} (${verdictRule})` },
      ],
    }),
  );
};

const zeroClaimNote = {
  figure: 'returnsNeeded',
  code: 'claimOfZero',
  text: 'A claim of zero cannot be told from zero, so there is no count of returns for that.',
} as const;

const answerOnRatio = (asked: Asked, question: ClaimQuestion): Result<ClaimAnswer> => {
  const { sample, policy } = asked;
  const claimed = perDay(question, policy.periodsPerYear);
  const { level, side } = question;
  const { smallestMeanThatMatters } = policy;
  const found = claimOnRatio({ returns: sample.returns, claimed, level, side, smallestMeanThatMatters });
  if (!found.ok) return found;
  const claim = found.value;
  const figures: ClaimFigures = {
    ...claim,
    of: 'ratio',
    claimedPer: question.claimed.per,
    side,
    decidedBy: 'plain',
    confidenceLevel: levelFraction(level),
  };
  return succeed(
    enclose(asked, {
      kind: 'claim',
      verb: 'claim',
      figures,
      warnings: coverageWarnings('ratio.noncentralT', 'this interval of the ratio', sample.returns, level),
      notes: [
        ...(claim.returnsNeeded === null ? [zeroClaimNote] : []),
        { figure: 'estimate', code: 'nothingDeducted', text: 'Nothing risk-free is deducted from the mean.' },
      ],
      method: 'test of the ratio by the noncentral t',
      sources: ['Johnson & Welch (1940), Biometrika 31'],
      working: [
        returnsStep(sample, asked.returnType),
        ...divisionStep(question, claimed, policy.periodsPerYear),
        {
          step: 'Distance from the claim',
          text: `√n·mean/s = ${workingDigits(claim.t)} under the noncentral t of the claimed ratio ${workingDigits(claimed)}, ${claim.degreesOfFreedom} degrees of freedom: p ${probabilityValue(claim.p)}`,
        },
        { step: 'Interval', text: `${levelText(level)}: ${endsText(claim)}` },
        countStep(claim.returnsNeeded, claim.detectableAt80),
        { step: 'Verdict', text: `${claim.verdict} (${verdictRule})` },
      ],
    }),
  );
};

/** Do the data bear out a stated mean or ratio? */
export const answerClaim = (
  read: ReadQuestion,
  question: ClaimQuestion,
  series: PriceSeries,
  policy: AnswerPolicy,
): Result<ClaimAnswer> => {
  const asked = askOne(read, question, series, policy);
  if (!asked.ok) return asked;
  return question.of === 'mean' ? answerOnMean(asked.value, question) : answerOnRatio(asked.value, question);
};
