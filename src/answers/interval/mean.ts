import type { IntervalQuestion } from '../../questions/question.ts';
import { annualMean } from '../../stats/mean/annual.ts';
import { meanLadder } from '../../stats/mean/ladder.ts';
import { predictionInterval } from '../../stats/mean/prediction.ts';
import { type TrustedMeanInterval, trustedMeanInterval } from '../../stats/mean/trustedInterval.ts';
import { meanWidths } from '../../stats/mean/widths.ts';
import { createStreams } from '../../stats/random/xoshiro128.ts';
import { levelFraction } from '../../terms/level.ts';
import { type Result, succeed } from '../../terms/result.ts';
import type { MeanAnswer, Note, Warning } from '../answer.ts';
import { type Asked, enclose } from '../envelope.ts';
import { coverageWarnings } from '../measured.ts';
import type { MeanFigures } from './figures.ts';
import { meanWarnings } from './meanWarnings.ts';
import { meanWorking } from './meanWorking.ts';

const sources = [
  'Student (1908), “The probable error of a mean”, Biometrika 6',
  'Newey & West (1987), Econometrica 55; bandwidth Newey & West (1994), Review of Economic Studies 61',
  'Ljung & Box (1978), Biometrika 65; robust form Lo & MacKinlay (1989), Dalla, Giraitis & Phillips (2022)',
  'Studentised bootstrap: Efron (1982), Hall (1988); stationary bootstrap: Politis & Romano (1994)',
  'Annual figures: trade practice, without a source',
] as const;

type Prediction = {
  readonly lower: number | null;
  readonly upper: number | null;
  readonly tooNarrow: boolean;
};

/** The interval that leads: the dependence-proof one where it was asked for and can be had. */
const leading = (trusted: TrustedMeanInterval, robustAsked: boolean): MeanFigures['trust'] =>
  robustAsked && trusted.neweyWest !== null ? 'neweyWest' : trusted.trust;

const leadingName = {
  plain: 'the plain interval',
  neweyWest: 'the Newey–West interval',
  bootstrap: 'the bootstrap interval',
} as const;

const coveredAs = (leads: MeanFigures['trust'], { bootstrap }: TrustedMeanInterval) =>
  leads === 'bootstrap'
    ? (`mean.${bootstrap?.method ?? 'studentised'}` as const)
    : (`mean.${leads}` as const);

const evidenceFigures = ({ evidence }: TrustedMeanInterval) => ({
  lag1Autocorrelation: evidence.lag1Autocorrelation,
  ljungBoxQ: evidence.ljungBox?.q ?? null,
  ljungBoxP: evidence.ljungBox?.p ?? null,
  ljungBoxLags: evidence.ljungBox?.lags ?? null,
  robustQ: evidence.robustAutocorrelation?.q ?? null,
  robustQP: evidence.robustAutocorrelation?.p ?? null,
  skewness: evidence.skewness,
  excessKurtosis: evidence.excessKurtosis,
});

const annualOrNull = (value: number | null, periodsPerYear: number) =>
  value === null ? null : annualMean(value, periodsPerYear);

const intervalFigures = (trusted: TrustedMeanInterval, periodsPerYear: number) => {
  const { plain, neweyWest, bootstrap } = trusted;
  return {
    mean: plain.mean,
    sampleStandardDeviation: plain.sampleStandardDeviation,
    standardError: plain.standardError,
    degreesOfFreedom: plain.degreesOfFreedom,
    criticalT: plain.criticalT,
    lower: plain.lower,
    upper: plain.upper,
    normalLower: plain.normalLower,
    normalUpper: plain.normalUpper,
    annualMean: annualMean(plain.mean, periodsPerYear),
    annualLower: annualOrNull(plain.lower, periodsPerYear),
    annualUpper: annualOrNull(plain.upper, periodsPerYear),
    neweyWestLower: neweyWest?.lower ?? null,
    neweyWestUpper: neweyWest?.upper ?? null,
    bootstrapMethod: bootstrap?.method ?? null,
    bootstrapLower: bootstrap?.lower ?? null,
    bootstrapUpper: bootstrap?.upper ?? null,
  };
};

const notesFor = ({ neweyWest, bootstrap }: TrustedMeanInterval): readonly Note[] => [
  ...(neweyWest === null
    ? [{ figure: 'neweyWestLower', code: 'tooFewReturns', text: 'Newey–West needs at least 20 returns.' }]
    : []),
  ...(bootstrap === null
    ? [
        {
          figure: 'bootstrapLower',
          code: 'notCalledFor',
          text: 'No bootstrap: returns are neither dependent nor few and lopsided, or fewer than 10. Add robust to ask for one.',
        },
      ]
    : []),
];

const predictionWarnings = ({ tooNarrow }: Prediction): readonly Warning[] =>
  tooNarrow
    ? [
        {
          code: 'predictionTooNarrow',
          text: 'the tails are fatter than the bell curve’s, so the range for one further day is too narrow at this level: ask tail instead.',
        },
      ]
    : [];

/** Where the true mean daily return can lie. */
export const answerMean = (asked: Asked, question: IntervalQuestion): Result<MeanAnswer> => {
  const { sample, policy, identity } = asked;
  const { returns } = sample;
  const { level, side, robust } = question;
  const streams = createStreams(identity.seedBytes);
  const found = trustedMeanInterval({ returns, level, side, streams, bootstrapAsked: robust });
  if (!found.ok) return found;
  const prediction = predictionInterval(returns, level, side);
  if (!prediction.ok) return prediction;
  const ladder = meanLadder(returns, side);
  if (!ladder.ok) return ladder;
  const widths = meanWidths(returns, level, side);
  if (!widths.ok) return widths;
  const trusted = found.value;
  const leads = leading(trusted, robust);
  const figures: MeanFigures = {
    ...intervalFigures(trusted, policy.periodsPerYear),
    ...evidenceFigures(trusted),
    confidenceLevel: levelFraction(level),
    side,
    predictionLower: prediction.value.lower,
    predictionUpper: prediction.value.upper,
    ladder: ladder.value.map((step) => ({
      confidenceLevel: levelFraction(step.level),
      lower: step.lower,
      upper: step.upper,
    })),
    widths: widths.value,
    trust: leads,
    annualLeads: question.annual,
  };
  return succeed(
    enclose(asked, {
      kind: 'interval mean',
      verb: 'interval',
      figures,
      warnings: [
        ...meanWarnings(trusted, leads),
        ...coverageWarnings(coveredAs(leads, trusted), leadingName[leads], returns, level),
        ...predictionWarnings(prediction.value),
      ],
      notes: notesFor(trusted),
      method: 'Student’s t interval of the mean',
      sources,
      working: meanWorking({
        sample,
        level,
        returnType: asked.returnType,
        trusted,
        ladder: ladder.value,
        widths: widths.value,
      }),
    }),
  );
};
