import type { ShapeAnswer } from '../../../answers/answer.ts';
import type { QuantilePoint } from '../../../answers/pictures/pictureData.ts';
import { percent } from '../../../wording/percent.ts';
import { capitalised, counted, possessive } from '../../../wording/words.ts';
import { windowInWords } from '../../compose/parts.ts';
import { degreesInWords, shapeReply, verdictOnTails } from '../../compose/shape.ts';
import { colours } from '../look.ts';
import { domainOf } from '../panels/axes.ts';
import { quantilePanel } from '../panels/quantiles.ts';
import type { Sheet } from '../sheet.ts';
import { altText, identified } from './parts.ts';

type Fitted = { readonly expected: number; readonly observed: number };

const against = (
  points: readonly QuantilePoint[],
  which: (point: QuantilePoint) => number | null,
): readonly Fitted[] =>
  points.flatMap((point) => {
    const expected = which(point);
    return expected === null ? [] : [{ expected, observed: point.observed }];
  });

/** The ends of a fitted t can lie far beyond any return; the plot then ends at half as much again as the returns reach. */
const domainOfPoints = (points: readonly QuantilePoint[]) => {
  const reach = 1.5 * Math.max(...points.map(({ observed }) => Math.abs(observed)));
  const seen = points.flatMap(({ observed, normal, student }) => [observed, normal, student ?? observed]);
  return domainOf(seen.filter((value) => Math.abs(value) <= reach));
};

/** The worst day beside what each distribution expects of the worst of so many. */
const worstInWords = (points: readonly QuantilePoint[], returnCount: number): string => {
  const [worst] = points;
  if (worst === undefined) return '';
  const expected = [
    ...(worst.student === null ? [] : [`the fitted t ${percent(worst.student)}`]),
    `the bell curve ${percent(worst.normal)}`,
  ];
  return `The worst of ${counted(returnCount, 'day')} was ${percent(worst.observed)}, where ${expected.join(' and ')} would be expected.`;
};

/** Each return against what the bell curve and the fitted t expect at its rank. */
export const shapeSheet = (answer: ShapeAnswer, points: readonly QuantilePoint[]): Sheet => {
  const student = against(points, (point) => point.student);
  const plots = [
    {
      head: 'Against the bell curve',
      axisTitle: 'expected return',
      shape: 'triangle-up' as const,
      colour: colours.vermillion,
      points: against(points, (point) => point.normal),
    },
    ...(student.length === 0
      ? []
      : [
          {
            head: 'Against the fitted t',
            axisTitle: 'expected return',
            shape: 'circle' as const,
            colour: colours.blue,
            points: student,
          },
        ]),
  ];
  const worst = worstInWords(points, answer.returnCount);
  return {
    ...identified(answer),
    title: `${possessive(answer.subject[0] ?? '')} tails ${windowInWords(answer)} ${verdictOnTails(answer.figures)}`,
    lines: [
      'Up: returns. Across: what is expected at their rank. On the dashed line they agree.',
      ...(answer.figures.nu === null
        ? []
        : [`${capitalised(degreesInWords(answer.figures).replace(/^: /, ''))}.`]),
    ],
    panels: [quantilePanel(plots, domainOfPoints(points))],
    altText: altText([
      'Quantile plots: each return against the one expected at its rank, by the bell curve and by the fitted t.',
      shapeReply(answer).sentence,
      worst,
    ]),
  };
};
