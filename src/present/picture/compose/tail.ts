import type { TailAnswer } from '../../../answers/answer.ts';
import type { ReturnPicture } from '../../../answers/pictures/pictureData.ts';
import type { TailModelFigures } from '../../../answers/tail/figures.ts';
import { levelInWords, percent } from '../../../wording/percent.ts';
import { counted, possessive } from '../../../wording/words.ts';
import { windowInWords } from '../../compose/parts.ts';
import { given, leadingOf, rangeInWords, tailReply } from '../../compose/tail.ts';
import { type Domain, plotFrame } from '../panels/axes.ts';
import { type ModelMark, modelPanel } from '../panels/models.ts';
import { histogramPanel, lossPanel, shareLabels } from '../panels/returns.ts';
import type { Panel, Sheet } from '../sheet.ts';
import { altText, identified } from './parts.ts';

/** Short enough for the side of a picture. */
const shortName = ({ model, parameters }: TailModelFigures): string =>
  model === 'filtered' ? `filtered ${parameters['kind'] === 'garch' ? 'GARCH' : 'EWMA'}` : model;

const marksOf = (figures: TailModelFigures): readonly ModelMark[] => {
  const name = shortName(figures);
  const { var: value, varLower, varUpper, es, esLower, esUpper } = figures;
  return [
    { name, line: 'upper', estimate: value, lower: varLower, upper: varUpper },
    ...(es === null ? [] : [{ name, line: 'lower' as const, estimate: es, lower: esLower, upper: esUpper }]),
  ];
};

/** As wide as the losses and the figures take; an interval may reach further, and then ends in an arrow. */
const lossDomain = (
  { losses, curve }: ReturnPicture,
  marks: readonly ModelMark[],
  oneDay: boolean,
): Domain => {
  const from = oneDay ? Math.min(curve[0]?.loss ?? 0, ...marks.map(({ estimate }) => estimate)) : 0;
  const largest = Math.max(oneDay ? (losses[0]?.loss ?? 0) : 0, ...marks.map(({ estimate }) => estimate));
  const reach = Math.max(...marks.map(({ upper, estimate }) => upper ?? estimate));
  return [from, Math.min(1.5 * largest, Math.max(1.1 * largest, 1.02 * reach))];
};

const rareLoss = (answer: TailAnswer): string => `${levelInWords(answer.figures.tailLevel)} VaR`;

const samplePanels = (
  answer: TailAnswer,
  returns: ReturnPicture,
  leading: TailModelFigures,
  domain: Domain,
  frame: ReturnType<typeof plotFrame>,
): readonly Panel[] => {
  const whose = answer.figures.position === 'short' ? 'Returns of the short position' : 'Returns';
  return [
    histogramPanel({
      head: `${whose}: number of days`,
      returns,
      landmarks: [{ value: 0 - leading.var, label: 'VaR' }],
      frame,
    }),
    lossPanel({
      head: 'Loss side, magnified: share of days that lost as much',
      returns,
      domain,
      landmarks: [
        { value: leading.var, label: 'VaR' },
        ...(leading.es === null ? [] : [{ value: leading.es, label: 'ES' }]),
      ],
      frame,
      axisTitle: null,
    }),
  ];
};

const inWords = (figures: TailModelFigures, level: string): string =>
  `${shortName(figures)} VaR ${rangeInWords(figures, level)}${figures.es === null ? '' : `, ES ${percent(figures.es)}`}`;

/** Histogram with both fits, the loss side magnified, and VaR and ES of each model with their intervals. */
export const tailSheet = (answer: TailAnswer, returns: ReturnPicture): Sheet => {
  const { figures, subject } = answer;
  const models = given(figures.models);
  const leading = leadingOf(figures.models);
  if (leading === null) throw new Error('tailSheet: an answer without a figure');
  const marks = models.flatMap(marksOf);
  const names = models.map(shortName);
  const frame = plotFrame([...names, ...shareLabels]);
  const level = levelInWords(figures.confidenceLevel);
  const oneDay = figures.horizonDays === 1;
  const domain = lossDomain(returns, marks, oneDay);
  const horizon = oneDay ? 'a day' : counted(figures.horizonDays, 'day');
  return {
    ...identified(answer),
    title: `${possessive(subject[0] ?? '')} tail ${windowInWords(answer)}`,
    lines: [
      `${rareLoss(answer)} of ${horizon} by the ${shortName(leading)} model: ${rangeInWords(leading, level)}.`,
    ],
    panels: [
      ...(oneDay ? samplePanels(answer, returns, leading, domain, frame) : []),
      modelPanel({
        head: `VaR (●, upper) and ES (◆, lower), at ${level}`,
        names,
        marks,
        domain,
        frame,
        axisTitle: oneDay ? 'loss, % a day' : `loss, % over ${horizon}`,
      }),
    ],
    altText: altText([
      oneDay
        ? 'Histogram of returns with the fitted t and the bell curve, the loss side magnified, and the tail figures of each model.'
        : 'Tail figures of each model with their intervals.',
      tailReply(answer).sentence,
      `At ${level}: ${models.map((each) => inWords(each, level)).join('; ')}.`,
      oneDay ? lossesInWords(returns) : '',
    ]),
  };
};

/** What the magnified side shows of the largest losses. */
const lossesInWords = ({ losses }: ReturnPicture): string => {
  const [largest] = losses;
  return largest === undefined ? '' : `The largest loss in the window is ${percent(largest.loss)}.`;
};
