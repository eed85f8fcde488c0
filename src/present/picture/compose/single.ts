import type { Answers, ClaimAnswer, CompareAnswer, RatioAnswer, VolAnswer } from '../../../answers/answer.ts';
import { type WrittenBounds, writeBounds } from '../../../wording/estimate.ts';
import { levelInWords, percentBounds } from '../../../wording/percent.ts';
import { listed, possessive } from '../../../wording/words.ts';
import { answersReply } from '../../answerReply.ts';
import { claimedDigits, claimReply, writing } from '../../compose/claim.ts';
import { meanBounds, ratioBounds } from '../../compose/compare.ts';
import { intervalRatioReply } from '../../compose/intervalRatio.ts';
import { boundsOf, intervalVolReply } from '../../compose/intervalVol.ts';
import { windowInWords } from '../../compose/parts.ts';
import { domainOf } from '../panels/axes.ts';
import { type Landmark, type Strip, type StripPanel, stripColumns, stripPanel } from '../panels/strips.ts';
import type { Sheet } from '../sheet.ts';
import { altText, identified } from './parts.ts';

/** `0.96 to 1.22%`; an open end is said. */
export const rangeOf = ({ lower, upper }: WrittenBounds, unit: string): string => {
  if (lower === null) return `up to ${upper}${unit}`;
  return upper === null ? `from ${lower}${unit}` : `${lower} to ${upper}${unit}`;
};

type Ends = { readonly estimate: number; readonly lower: number | null; readonly upper: number | null };

const strip = (label: string, ends: Ends, written: WrittenBounds, unit: string, main = true): Strip => ({
  label,
  ...ends,
  figures: rangeOf(written, unit),
  tone: main ? 'main' : 'quiet',
});

const readAloud = (strips: readonly Strip[]): string =>
  `${strips.map(({ label, figures }) => `${label} ${figures}`).join('; ')}.`;

const panelOf = (
  strips: readonly Strip[],
  landmarks: readonly Landmark[],
  more: Pick<StripPanel, 'head' | 'axisTitle' | 'format'>,
  columns = stripColumns(strips),
) =>
  stripPanel({
    ...more,
    strips,
    landmarks,
    domain: domainOf([
      ...landmarks.map(({ value }) => value),
      ...strips.flatMap(({ estimate, lower, upper }) => [estimate, lower, upper]),
    ]),
    columns,
  });

const zero: Landmark = { value: 0, label: 'zero' };

const volMethods = { chiSquare: 'chi-square', bonett: 'Bonett', block: 'blocks' } as const;

/** The standard deviation with the interval of each method; the one that the verdict rests on stands out. */
export const volSheet = (answer: VolAnswer): Sheet => {
  const { figures, subject } = answer;
  const estimate = figures.sampleStandardDeviation;
  const bounds = boundsOf(figures);
  const level = levelInWords(figures.confidenceLevel);
  const strips = (['chiSquare', 'bonett', 'block'] as const)
    .filter((method) => bounds[method].lower !== null || bounds[method].upper !== null)
    .map((method) => {
      const ends = { estimate, ...bounds[method] };
      const written = percentBounds(ends, undefined, { plus: false });
      return strip(volMethods[method], ends, written, '%', method === figures.trust);
    });
  return {
    ...identified(answer),
    title: `${possessive(subject[0] ?? '')} daily volatility ${windowInWords(answer)}`,
    lines: [`Its interval at ${level} by each method; the one to go by is ${volMethods[figures.trust]}.`],
    panels: [panelOf(strips, [], { head: null, axisTitle: 'standard deviation, % a day', format: '~%' })],
    altText: altText([
      'Intervals of the standard deviation.',
      intervalVolReply(answer).sentence,
      readAloud(strips),
    ]),
  };
};

export const ratioSheet = (answer: RatioAnswer): Sheet => {
  const { figures, subject } = answer;
  const ends = { estimate: figures.annualRatio, lower: figures.annualLower, upper: figures.annualUpper };
  const strips = [strip(levelInWords(figures.confidenceLevel), ends, writeBounds(ends), '')];
  return {
    ...identified(answer),
    title: `${possessive(subject[0] ?? '')} mean over standard deviation ${windowInWords(answer)}`,
    lines: ['Annual ratio; nothing risk-free is deducted.'],
    panels: [panelOf(strips, [zero], { head: null, axisTitle: 'annual ratio', format: '+~g' })],
    altText: altText(['Interval of a ratio.', intervalRatioReply(answer).sentence]),
  };
};

/** The interval with the claimed value and zero marked. */
export const claimSheet = (answer: ClaimAnswer): Sheet => {
  const { figures, subject } = answer;
  const { bounds, unit } = writing(figures);
  const { estimate, lower, upper, claimed, confidenceLevel, of } = figures;
  const strips = [strip(levelInWords(confidenceLevel), { estimate, lower, upper }, bounds, unit)];
  const said = `claimed ${claimedDigits(figures, bounds.decimals)}${unit}`;
  const landmarks =
    claimed === 0 ? [{ value: 0, label: 'claimed 0' }] : [zero, { value: claimed, label: said }];
  const sentence = claimReply(answer).sentence;
  return {
    ...identified(answer),
    title: `${subject[0] ?? ''}, ${said} a day: ${figures.verdict}`,
    lines: [`Estimate ${bounds.estimate}${unit} ${windowInWords(answer)}, with its interval.`],
    panels: [
      panelOf(strips, landmarks, {
        head: null,
        axisTitle: of === 'mean' ? 'mean return, % a day' : 'mean over standard deviation, a day',
        format: of === 'mean' ? '+~%' : '+~g',
      }),
    ],
    altText: altText(['Interval with the claimed value marked.', sentence]),
  };
};

const isComparison = (answer: { readonly kind: string }): answer is CompareAnswer =>
  answer.kind === 'compare';

const pairName = ({ figures: { order, kind } }: CompareAnswer): string =>
  kind === 'paired' ? order.join(' − ') : 'after − before';

const meanStrip = (answer: CompareAnswer): Strip => {
  const { difference: estimate, lower, upper, meansDiffer } = answer.figures;
  return strip(pairName(answer), { estimate, lower, upper }, meanBounds(answer.figures), '%', meansDiffer);
};

const spreadStrip = (answer: CompareAnswer): readonly Strip[] => {
  const { deviationRatio: estimate, ratioLower: lower, ratioUpper: upper, spreadsDiffer } = answer.figures;
  const written = ratioBounds(answer.figures);
  if (estimate === null || written === null) return [];
  const label = pairName(answer).replace(' − ', ' / ');
  return [strip(label, { estimate, lower, upper }, written, '', spreadsDiffer)];
};

/** Which pairs are told apart, by name, so that it does not hang on the colour. */
const apartInWords = (pairs: readonly CompareAnswer[]): string => {
  const named = (apart: (pair: CompareAnswer) => boolean): string => {
    const found = pairs.filter(apart).map(pairName);
    return found.length === 0 ? 'none' : listed(found);
  };
  const adjusted = pairs.length > 1 ? ', adjusted for all pairs' : '';
  return `Told apart${adjusted}: means, ${named(({ figures }) => figures.meansDiffer)}; spreads, ${named(({ figures }) => figures.spreadsDiffer)}.`;
};

/** Differences of means and ratios of standard deviations, pair by pair, beside zero and one. */
export const compareSheet = (answers: Answers, first: CompareAnswer): Sheet => {
  const pairs = answers.filter(isComparison);
  const means = pairs.map(meanStrip);
  const spreads = pairs.flatMap(spreadStrip);
  const columns = stripColumns([...means, ...spreads]);
  const names = [...new Set(pairs.flatMap(({ subject }) => subject))];
  const level = levelInWords(first.figures.confidenceLevel);
  return {
    ...identified({ ...first, subject: names }),
    title: `${names.join(', ')} compared ${windowInWords(first)}`,
    lines: [`Intervals at ${level}, each pair alone.`, apartInWords(pairs)],
    panels: [
      panelOf(
        means,
        [zero],
        { head: 'Difference of mean returns', axisTitle: '% a day', format: '+~%' },
        columns,
      ),
      ...(spreads.length === 0
        ? []
        : [
            panelOf(
              spreads,
              [{ value: 1, label: 'equal' }],
              { head: 'Ratio of standard deviations', axisTitle: null, format: '~g' },
              columns,
            ),
          ]),
    ],
    altText: altText([
      'Intervals side by side.',
      answersReply(answers).sentence,
      `Difference of mean returns: ${readAloud(means)}`,
      spreads.length === 0 ? '' : `Ratio of standard deviations: ${readAloud(spreads)}`,
    ]),
  };
};
