import type { RatioAnswer } from '../../answers/answer.ts';
import { writeBounds } from '../../wording/estimate.ts';
import { levelInWords } from '../../wording/percent.ts';
import { possessive } from '../../wording/words.ts';
import type { Reply } from '../reply.ts';
import { againstZero, framed, placeInWords, windowInWords } from './parts.ts';

export const intervalRatioReply = (answer: RatioAnswer): Reply => {
  const { figures } = answer;
  const daily = writeBounds({ estimate: figures.ratio, lower: figures.lower, upper: figures.upper });
  const annual = writeBounds({
    estimate: figures.annualRatio,
    lower: figures.annualLower,
    upper: figures.annualUpper,
  });
  const sentence =
    `${possessive(answer.subject[0] ?? '')} mean daily return ${windowInWords(answer)} is ${daily.estimate} of its ` +
    `standard deviation (${annual.estimate} a year), and at ${levelInWords(figures.confidenceLevel)} the true annual ratio ` +
    `lies ${placeInWords(annual, '')}: ${againstZero(figures)}.`;
  const cells = (name: string, { estimate, lower, upper }: typeof daily) => [
    name,
    estimate,
    lower ?? 'no bound',
    upper ?? 'no bound',
  ];
  return framed(answer, sentence, {
    table: {
      columns: [
        { head: 'mean / deviation', align: 'left' },
        { head: 'estimate', align: 'right' },
        { head: 'from', align: 'right' },
        { head: 'to', align: 'right' },
      ],
      rows: [cells('A day', daily), cells('A year', annual)],
    },
    figuresInWords: `A day: ${daily.estimate}, ${placeInWords(daily, '')}. Nothing risk-free is deducted`,
  });
};
