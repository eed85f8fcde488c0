import type { IntervalQuestion } from '../../questions/question.ts';
import { annualDeviation } from '../../stats/mean/annual.ts';
import { sampleStandardDeviation } from '../../stats/moments/deviation.ts';
import { createStreams } from '../../stats/random/xoshiro128.ts';
import { type DeviationTrust, deviationTrust, deviationTrustReasons } from '../../stats/spread/trust.ts';
import { levelFraction, levelText } from '../../terms/level.ts';
import { type Result, succeed } from '../../terms/result.ts';
import { workingDigits } from '../../wording/digits.ts';
import { probabilityValue } from '../../wording/words.ts';
import type { Note, VolAnswer, Warning, WorkingStep } from '../answer.ts';
import { type Asked, enclose } from '../envelope.ts';
import { coverageWarnings } from '../measured.ts';
import { endsText, returnsStep } from '../working.ts';
import type { VolFigures } from './figures.ts';

const sources = [
  'Chi-square interval: NIST/SEMATECH e-Handbook of Statistical Methods, section 1.3.5.8',
  'Bonett (2006), Computational Statistics & Data Analysis 50',
  'Stationary bootstrap: Politis & Romano (1994); block length Politis & White (2004), Patton, Politis & White (2009)',
  'Annual figures: trade practice, without a source; √ of the days needs returns without autocorrelation (Lo 2002)',
] as const;

type Leading = VolFigures['trust'];

/** The interval that leads: the resampled blocks where they were asked for and can be had. */
const leadingOf = (trust: DeviationTrust, robustAsked: boolean): Leading =>
  robustAsked && trust.block !== null ? 'block' : trust.trust;

const leadingName = {
  chiSquare: 'the chi-square interval',
  bonett: 'Bonett’s interval',
  block: 'the interval by resampled blocks',
} as const;

const leadingEnds = (trust: DeviationTrust, leading: Leading) => trust[leading] ?? trust.chiSquare;

const warningsFor = ({ reason, clustering }: DeviationTrust, leading: Leading): readonly Warning[] => {
  if (reason === 'clustered')
    return [
      {
        code: 'volatilityClusters',
        text: `volatility clusters (p ${probabilityValue(clustering.p)}): calm and stormy stretches follow each other, so the chi-square and Bonett rows are far too narrow. Read the resampled blocks, and those with care.`,
      },
    ];
  if (reason === 'fatTailed')
    return [
      {
        code: 'fatTails',
        text: `the tails are fatter than the bell curve’s, so the chi-square row is too narrow: read the ${leading === 'block' ? 'resampled blocks' : 'Bonett row'}.`,
      },
    ];
  return reason === 'outOfReach'
    ? [
        {
          code: 'trustOutOfReach',
          text: 'the chi-square interval is in doubt here and under 10 returns nothing replaces it: ask for a longer window.',
        },
      ]
    : [];
};

const notesFor = ({ bonett, block }: DeviationTrust): readonly Note[] => [
  ...(bonett === null
    ? [{ figure: 'bonettLower', code: 'tooFewReturns', text: 'Bonett’s interval needs at least 10 returns.' }]
    : []),
  ...(block === null
    ? [
        {
          figure: 'blockLower',
          code: 'notCalledFor',
          text: 'No resampled blocks: volatility is not found to cluster, or there are fewer than 10 returns.',
        },
      ]
    : []),
];

const steps = (
  asked: Asked,
  question: IntervalQuestion,
  deviation: number,
  trust: DeviationTrust,
): WorkingStep[] => {
  const n = asked.sample.returns.length;
  const s = workingDigits(deviation);
  const kurtosis =
    trust.excessKurtosis === null ? '' : `; excess kurtosis ${workingDigits(trust.excessKurtosis)}`;
  return [
    returnsStep(asked.sample, asked.returnType),
    { step: 'Standard deviation', text: `√(Σ(r − mean)² / (n − 1)), n − 1 = ${n - 1}: s = ${s}` },
    {
      step: 'Chi-square interval',
      text: `s·√((n − 1)/χ²), ${n - 1} degrees of freedom, ${levelText(question.level)}: ${endsText(trust.chiSquare)}`,
    },
    ...(trust.bonett === null
      ? []
      : [
          {
            step: 'Bonett',
            text: `standard error of the log variance from the fourth moment: ${endsText(trust.bonett)}`,
          },
        ]),
    ...(trust.block === null
      ? []
      : [
          {
            step: 'Resampled blocks',
            text: `9,999 resamples, mean block ${workingDigits(trust.block.blockLength)} returns: ${endsText(trust.block)}`,
          },
        ]),
    {
      step: 'Does volatility cluster?',
      text: `robust test of squared returns, ${trust.clustering.lags} lags: p ${probabilityValue(trust.clustering.p)}${kurtosis}`,
    },
    { step: 'Which to believe', text: deviationTrustReasons[trust.reason] },
  ];
};

/** Where the true standard deviation of daily returns can lie. */
export const answerVol = (asked: Asked, question: IntervalQuestion): Result<VolAnswer> => {
  const { sample, policy, identity } = asked;
  const { returns } = sample;
  const found = deviationTrust({
    returns,
    level: question.level,
    streams: createStreams(identity.seedBytes),
    blockAsked: question.robust,
  });
  if (!found.ok) return found;
  const trust = found.value;
  const deviation = sampleStandardDeviation(returns);
  const leading = leadingOf(trust, question.robust);
  const ends = leadingEnds(trust, leading);
  const figures: VolFigures = {
    sampleStandardDeviation: deviation,
    confidenceLevel: levelFraction(question.level),
    lower: trust.chiSquare.lower,
    upper: trust.chiSquare.upper,
    bonettLower: trust.bonett?.lower ?? null,
    bonettUpper: trust.bonett?.upper ?? null,
    blockLower: trust.block?.lower ?? null,
    blockUpper: trust.block?.upper ?? null,
    excessKurtosis: trust.excessKurtosis,
    annualDeviation: annualDeviation(deviation, policy.periodsPerYear),
    annualDeviationLower: annualDeviation(ends.lower, policy.periodsPerYear),
    annualDeviationUpper: annualDeviation(ends.upper, policy.periodsPerYear),
    trust: leading,
  };
  return succeed(
    enclose(asked, {
      kind: 'interval vol',
      verb: 'interval',
      figures,
      warnings: [
        ...warningsFor(trust, leading),
        ...coverageWarnings(`deviation.${leading}`, leadingName[leading], returns, question.level),
      ],
      notes: notesFor(trust),
      method: 'interval of the standard deviation',
      sources,
      working: steps(asked, question, deviation, trust),
    }),
  );
};
