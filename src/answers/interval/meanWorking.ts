import type { LadderStep } from '../../stats/mean/ladder.ts';
import { meanTrustReasons, type TrustedMeanInterval } from '../../stats/mean/trustedInterval.ts';
import type { MeanWidth } from '../../stats/mean/widths.ts';
import type { Level } from '../../terms/level.ts';
import { levelText } from '../../terms/level.ts';
import { workingDigits } from '../../wording/digits.ts';
import { counted, probabilityValue } from '../../wording/words.ts';
import type { WorkingStep } from '../answer.ts';
import type { ReturnSample } from '../sample.ts';
import { endsText, returnsStep } from '../working.ts';

type MeanParts = {
  readonly sample: ReturnSample;
  readonly level: Level;
  readonly returnType: 'simple' | 'log';
  readonly trusted: TrustedMeanInterval;
  readonly ladder: readonly LadderStep[];
  readonly widths: readonly MeanWidth[];
};

const plainSteps = ({ sample, level, trusted }: MeanParts): WorkingStep[] => {
  const { plain } = trusted;
  const n = sample.returns.length;
  const [mean, s, se, t] = [
    plain.mean,
    plain.sampleStandardDeviation,
    plain.standardError,
    plain.criticalT,
  ].map(workingDigits);
  const total = workingDigits(plain.mean * n);
  return [
    { step: 'Mean', text: `sum of returns / n = ${total} / ${n} = ${mean}` },
    { step: 'Standard deviation', text: `√(Σ(r − mean)² / (n − 1)), n − 1 = ${n - 1}: s = ${s}` },
    { step: 'Standard error', text: `s / √n = ${s} / √${n} = ${se}` },
    {
      step: 'Critical value',
      text: `Student’s t, ${plain.degreesOfFreedom} degrees of freedom, ${levelText(level)}: t = ${t}`,
    },
    { step: 'Interval', text: `mean ± t · s/√n = ${mean} ± ${t} · ${se}: ${endsText(plain)}` },
    {
      step: 'Bell curve instead',
      text: `z = ${workingDigits(plain.normalCritical)}: ${endsText({ lower: plain.normalLower, upper: plain.normalUpper })}, ${workingDigits(100 * plain.normalShortfall)}% too narrow`,
    },
  ];
};

const outlookSteps = ({ ladder, widths }: MeanParts): WorkingStep[] => [
  {
    step: 'Other levels',
    text: ladder.map((step) => `${levelText(step.level)}: ${endsText(step)}`).join('; '),
  },
  {
    step: 'With more returns',
    text: `half-width, s unchanged: ${widths.map(({ returnCount, halfWidth }) => `${counted(returnCount, 'return')} ${workingDigits(halfWidth)}`).join('; ')}`,
  },
];

const dependenceSteps = ({ trusted }: MeanParts): WorkingStep[] => {
  const { lag1Autocorrelation: lag1, ljungBox, robustAutocorrelation: robust } = trusted.evidence;
  if (lag1 === null || ljungBox === null || robust === null) return [];
  return [
    {
      step: 'Do returns follow each other?',
      text:
        `lag-1 autocorrelation ${workingDigits(lag1)}; over ${robust.lags} lags the robust test has Q = ${workingDigits(robust.q)}, ` +
        `p ${probabilityValue(robust.p)}; Ljung–Box has Q = ${workingDigits(ljungBox.q)}, p ${probabilityValue(ljungBox.p)}`,
    },
  ];
};

const otherIntervalSteps = ({ trusted: { neweyWest, bootstrap } }: MeanParts): WorkingStep[] => [
  ...(neweyWest === null
    ? []
    : [
        {
          step: 'Newey–West',
          text: `standard error ${workingDigits(neweyWest.standardError)} with ${counted(neweyWest.bandwidth, 'lag')}: ${endsText(neweyWest)}`,
        },
      ]),
  ...(bootstrap === null
    ? []
    : [
        {
          step: bootstrap.method === 'studentised' ? 'Studentised bootstrap' : 'Stationary bootstrap',
          text: `9,999 resamples${bootstrap.method === 'stationary' ? `, mean block ${workingDigits(bootstrap.blockLength)} returns` : ''}: ${endsText(bootstrap)}`,
        },
      ]),
];

const trustNames = { plain: 'Student’s t', neweyWest: 'Newey–West', bootstrap: 'the bootstrap' } as const;

/** The mean’s interval with this sample’s numbers in every formula. */
export const meanWorking = (parts: MeanParts): readonly WorkingStep[] => [
  returnsStep(parts.sample, parts.returnType),
  ...plainSteps(parts),
  ...outlookSteps(parts),
  ...dependenceSteps(parts),
  ...otherIntervalSteps(parts),
  {
    step: 'Which to believe',
    text: `${trustNames[parts.trusted.trust]}: ${meanTrustReasons[parts.trusted.reason]}`,
  },
];
