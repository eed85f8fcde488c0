import { isoFromDay } from '../terms/day.ts';
import type { ReturnType } from '../terms/returns.ts';
import { workingDigits } from '../wording/digits.ts';
import type { WorkingStep } from './answer.ts';
import type { ReturnSample } from './sample.ts';

/** `−0.00209 to 0.00337`; an end that there is not is said. */
export const endsText = ({
  lower,
  upper,
}: {
  readonly lower: number | null;
  readonly upper: number | null;
}): string => {
  if (lower === null && upper === null) return 'no bounds';
  if (lower === null) return `no lower bound, upper ${workingDigits(upper ?? 0)}`;
  return upper === null
    ? `lower ${workingDigits(lower)}, no upper bound`
    : `${workingDigits(lower)} to ${workingDigits(upper)}`;
};

const formulas = { simple: 'P[t]/P[t−1] − 1', log: 'ln(P[t]/P[t−1])' } as const;

/** The first step of every working: which returns, how many, of which days. */
export const returnsStep = (sample: ReturnSample, returnType: ReturnType): WorkingStep => ({
  step: 'Returns',
  text:
    `${returnType}, ${formulas[returnType]}, as decimal fractions; n = ${sample.returns.length}, ` +
    `${isoFromDay(sample.from)} to ${isoFromDay(sample.to)}, from ${sample.closes.length} closes`,
});
