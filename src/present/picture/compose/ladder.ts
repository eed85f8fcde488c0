import type { MeanAnswer } from '../../../answers/answer.ts';
import type { MeanFigures } from '../../../answers/interval/figures.ts';
import { digits } from '../../../wording/digits.ts';
import { levelInWords, percentBounds, percentDecimals } from '../../../wording/percent.ts';
import { counted, possessive } from '../../../wording/words.ts';
import { intervalMeanReply, meanDecimals, trustedBounds } from '../../compose/intervalMean.ts';
import { placeInWords, windowInWords } from '../../compose/parts.ts';
import { domainOf } from '../panels/axes.ts';
import { type Strip, stripColumns, stripPanel } from '../panels/strips.ts';
import type { Sheet } from '../sheet.ts';
import { altText, identified } from './parts.ts';

const trustNames = { plain: '', neweyWest: 'Newey–West', bootstrap: 'bootstrap' } as const;

/** `−0.21 to +0.34`; an open end is said. */
const rangeWords = (
  estimate: number,
  { lower, upper }: { readonly lower: number | null; readonly upper: number | null },
  decimals: number,
): string => {
  const written = percentBounds({ estimate, lower, upper }, decimals);
  if (written.lower === null) return `up to ${written.upper}%`;
  return written.upper === null ? `from ${written.lower}%` : `${written.lower} to ${written.upper}%`;
};

const ladderStrips = (figures: MeanFigures): readonly Strip[] => {
  const { mean, confidenceLevel, trust } = figures;
  const steps = figures.ladder.map((step) => ({
    label: levelInWords(step.confidenceLevel),
    estimate: mean,
    lower: step.lower,
    upper: step.upper,
    figures: rangeWords(
      mean,
      step,
      percentDecimals({ estimate: mean, lower: step.lower, upper: step.upper }),
    ),
    tone: step.confidenceLevel === confidenceLevel ? ('main' as const) : ('quiet' as const),
  }));
  const bounds = trustedBounds(figures);
  const asked = {
    label: `${levelInWords(confidenceLevel)} ${trustNames[trust]}`.trim(),
    estimate: mean,
    ...bounds,
    figures: rangeWords(mean, bounds, meanDecimals(figures)),
    tone: 'main' as const,
  };
  const standsAlready = trust === 'plain' && steps.some(({ tone }) => tone === 'main');
  return standsAlready ? steps : [...steps, asked];
};

const endsOf = ({ mean, side }: MeanFigures, halfWidth: number) => ({
  lower: side === 'below' ? null : mean - halfWidth,
  upper: side === 'above' ? null : mean + halfWidth,
});

const halfWidthNow = ({ mean, lower, upper }: MeanFigures): number =>
  upper === null ? mean - (lower ?? mean) : upper - mean;

const widthStrips = (answer: MeanAnswer): readonly Strip[] => {
  const { figures, returnCount } = answer;
  const now = { returnCount, halfWidth: halfWidthNow(figures) };
  return [now, ...figures.widths].map((width) => ({
    label: counted(width.returnCount, 'day'),
    estimate: figures.mean,
    ...endsOf(figures, width.halfWidth),
    figures: `± ${digits(100 * width.halfWidth, percentDecimals({ estimate: 0, lower: -width.halfWidth, upper: width.halfWidth }, []), { rounding: 'up' })}%`,
    tone: width.returnCount === returnCount ? ('main' as const) : ('quiet' as const),
  }));
};

/** The mean with its bars at four levels, zero marked, and how narrow the interval would be with more such days. */
export const ladderSheet = (answer: MeanAnswer): Sheet => {
  const { figures } = answer;
  const ladder = ladderStrips(figures);
  const widths = widthStrips(answer);
  const all = [...ladder, ...widths];
  const shared = {
    domain: domainOf([0, ...all.flatMap(({ lower, upper }) => [lower, upper])]),
    columns: stripColumns(all),
    format: '+~%',
  };
  const level = levelInWords(figures.confidenceLevel);
  const bounds = trustedBounds(figures);
  const trusted = percentBounds({ estimate: figures.mean, ...bounds });
  return {
    ...identified(answer),
    title: `${possessive(answer.subject[0] ?? '')} mean daily return ${windowInWords(answer)}`,
    lines: [`${trusted.estimate}% a day; at ${level} the true mean lies ${placeInWords(trusted, '%')}.`],
    panels: [
      stripPanel({
        ...shared,
        head: 'Interval by level',
        strips: ladder,
        landmarks: [{ value: 0, label: 'zero' }],
        axisTitle: null,
      }),
      stripPanel({
        ...shared,
        head: `At ${level}, were there more days like these`,
        strips: widths,
        landmarks: [{ value: 0, label: '' }],
        axisTitle: 'mean return, % a day',
      }),
    ],
    altText: altText([
      'Interval ladder.',
      intervalMeanReply(answer).sentence,
      `Bars from the narrowest: ${ladder.map(({ label, figures: words }) => `${label} ${words}`).join('; ')}.`,
      `Were there more days like these, at ${level}: ${widths.map(({ label, figures: words }) => `${label} ${words}`).join('; ')}.`,
    ]),
  };
};
