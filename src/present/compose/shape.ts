import type { ShapeAnswer } from '../../answers/answer.ts';
import type { ShapeFigures } from '../../answers/shape/figures.ts';
import type { NumberOrInfinity } from '../../answers/tail/figures.ts';
import { significant, threeDigits } from '../../wording/digits.ts';
import { levelInWords } from '../../wording/percent.ts';
import { possessive, probabilityValue } from '../../wording/words.ts';
import type { Reply, Table } from '../reply.ts';
import { framed, windowInWords } from './parts.ts';

const nuText = (value: NumberOrInfinity | null): string =>
  value === null ? 'not known' : value === 'infinity' ? 'infinity' : significant(value, 2);

const fatter = ({ likelihoodRatioP, andersonDarlingNormalP, confidenceLevel }: ShapeFigures): boolean =>
  (likelihoodRatioP ?? andersonDarlingNormalP) + confidenceLevel < 1;

const multipleWords = ({ tailMultiples }: ShapeFigures): string => {
  const four = tailMultiples.find(({ deviations }) => deviations === 4);
  return four === undefined
    ? ''
    : `, and a fall of 4 standard deviations is ${significant(four.multiple, 2)} times as likely as the bell curve says`;
};

const table = ({ figures }: ShapeAnswer): Table => ({
  columns: [
    { head: 'Against the bell curve', align: 'left' },
    { head: 'figure', align: 'right' },
    { head: 'p', align: 'right' },
  ],
  rows: [
    [
      'Jarque–Bera',
      threeDigits(figures.jarqueBera),
      probabilityValue(figures.jarqueBeraSimulatedP ?? figures.jarqueBeraP),
    ],
    [
      'Anderson–Darling',
      threeDigits(figures.andersonDarlingNormal),
      probabilityValue(figures.andersonDarlingNormalP),
    ],
    [
      't against bell curve, LR',
      figures.likelihoodRatio === null ? '' : threeDigits(figures.likelihoodRatio),
      figures.likelihoodRatioP === null ? '' : probabilityValue(figures.likelihoodRatioP),
    ],
    [
      'Does the t itself fit?',
      figures.andersonDarlingStudent === null ? '' : threeDigits(figures.andersonDarlingStudent),
      figures.andersonDarlingStudentP === null ? '' : probabilityValue(figures.andersonDarlingStudentP),
    ],
    [
      `Degrees of freedom, at ${levelInWords(figures.confidenceLevel)}`,
      `${nuText(figures.nu)}, ${nuText(figures.nuLower)} to ${nuText(figures.nuUpper)}`,
      '',
    ],
    [
      'Skewness; excess kurtosis',
      `${threeDigits(figures.skewness)}; ${threeDigits(figures.excessKurtosis)}`,
      '',
    ],
  ],
});

export const verdictOnTails = (figures: ShapeFigures): string =>
  fatter(figures) ? 'are fatter than the bell curve’s' : 'are not shown to be fatter than the bell curve’s';

/** `: the fitted t has 4.2 degrees of freedom, at 95% 3.1 to 6.4`; nothing where no t was fitted. */
export const degreesInWords = (figures: ShapeFigures): string =>
  figures.nu === null
    ? ''
    : `: the fitted t has ${nuText(figures.nu)} degrees of freedom, at ${levelInWords(figures.confidenceLevel)} ${nuText(figures.nuLower)} to ${nuText(figures.nuUpper)}`;

/** How fat the tails are. */
export const shapeReply = (answer: ShapeAnswer): Reply => {
  const { figures } = answer;
  const verdict = verdictOnTails(figures);
  const degrees = degreesInWords(figures);
  const sentence = `${possessive(answer.subject[0] ?? '')} tails ${windowInWords(answer)} ${verdict}${degrees}${figures.normalLimit === true ? '' : multipleWords(figures)}.`;
  return framed(answer, sentence, {
    table: table(answer),
    figuresInWords: `Skewness ${threeDigits(figures.skewness)}, excess kurtosis ${threeDigits(figures.excessKurtosis)}; Anderson–Darling p against the bell curve ${probabilityValue(figures.andersonDarlingNormalP)}`,
  });
};
