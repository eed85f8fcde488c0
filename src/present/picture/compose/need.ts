import type { NeedAnswer } from '../../../answers/answer.ts';
import type { NeedWidth } from '../../../answers/pictures/pictureData.ts';
import { digits } from '../../../wording/digits.ts';
import { levelInWords, typedBasisPoints } from '../../../wording/percent.ts';
import { needReply } from '../../compose/need.ts';
import { windowInWords } from '../../compose/parts.ts';
import { widthPanel } from '../panels/widths.ts';
import type { Sheet } from '../sheet.ts';
import { altText, identified } from './parts.ts';

/** How the interval narrows with the days, and where it is narrow enough. */
export const needSheet = (answer: NeedAnswer, widths: readonly NeedWidth[]): Sheet => {
  const { figures, subject } = answer;
  const size = typedBasisPoints(figures.detect);
  const level = levelInWords(figures.confidenceLevel);
  const words = [
    `± ${size} at ${level}: ${digits(figures.halfWidthReturns, 0)} days`,
    `told from zero with ${levelInWords(figures.power)} power: ${digits(figures.detectReturns, 0)} days`,
  ];
  return {
    ...identified(answer),
    title: `${subject[0] ?? ''}: how many days until ${size} a day could be told`,
    lines: [`By its volatility ${windowInWords(answer)}. ${words[0]}; ${words[1]}.`],
    panels: [
      widthPanel({
        head: `Half the width of the ${level} interval, % a day`,
        widths,
        wanted: { value: figures.halfWidth, label: size },
        counts: [
          { value: figures.halfWidthReturns, label: `± ${size}` },
          { value: figures.detectReturns, label: 'told from zero' },
        ],
      }),
    ],
    altText: altText([
      'The width of the interval against the number of days, falling as days are added.',
      needReply(answer).sentence,
      `${words.join('; ')}.`,
    ]),
  };
};
