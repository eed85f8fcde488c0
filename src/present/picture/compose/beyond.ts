import type { TailBeyondAnswer } from '../../../answers/answer.ts';
import type { ReturnPicture } from '../../../answers/pictures/pictureData.ts';
import { levelInWords, percentBounds, percentDecimals, typedPercent } from '../../../wording/percent.ts';
import { possessive } from '../../../wording/words.ts';
import { windowInWords } from '../../compose/parts.ts';
import { given, tailBeyondReply } from '../../compose/tailBeyond.ts';
import { domainOf, plotFrame } from '../panels/axes.ts';
import { lossPanel, shareLabels } from '../panels/returns.ts';
import { type Strip, stripColumns, stripPanel } from '../panels/strips.ts';
import type { Sheet } from '../sheet.ts';
import { altText, identified } from './parts.ts';
import { rangeOf } from './single.ts';

const stripOf = (each: ReturnType<typeof given>[number]): Strip => {
  const bounds = { estimate: each.probability, lower: each.lower ?? 0, upper: each.upper };
  const written = percentBounds(bounds, percentDecimals(bounds), { plus: false });
  return { label: each.model, ...bounds, figures: rangeOf(written, '%'), tone: 'main' };
};

/** The loss side magnified with the loss in question marked, and its chance by each model. */
export const beyondSheet = (answer: TailBeyondAnswer, returns: ReturnPicture): Sheet => {
  const { figures, subject } = answer;
  const strips = given(answer).map(stripOf);
  const loss = typedPercent(figures.threshold);
  const largest = Math.max(figures.threshold, returns.losses[0]?.loss ?? 0);
  const level = levelInWords(figures.confidenceLevel);
  return {
    ...identified(answer),
    title: `${possessive(subject[0] ?? '')} daily losses of ${loss} or more ${windowInWords(answer)}`,
    lines: [`They happened on ${figures.days.length} of ${answer.returnCount} days.`],
    panels: [
      lossPanel({
        head: 'Share of days that lost as much (t solid, bell curve dashed)',
        returns,
        domain: [Math.min(returns.curve[0]?.loss ?? 0, figures.threshold), 1.1 * largest],
        landmarks: [{ value: figures.threshold, label: loss }],
        frame: plotFrame([...strips.map(({ label }) => label), ...shareLabels]),
        axisTitle: 'loss, % a day',
      }),
      stripPanel({
        head: `Chance of it on a day, with its interval at ${level}`,
        strips,
        landmarks: [],
        domain: domainOf([0, ...strips.flatMap(({ estimate, upper }) => [estimate, upper])]),
        columns: stripColumns(strips),
        axisTitle: null,
        format: '~%',
      }),
    ],
    altText: altText([
      'The loss side magnified with the loss in question marked, and its chance by each model.',
      tailBeyondReply(answer).sentence,
      `At ${level}: ${strips.map(({ label, figures: words }) => `${label} ${words}`).join('; ')}.`,
    ]),
  };
};
