import type { CompareAnswer } from '../../answers/answer.ts';
import type { CompareFigures } from '../../answers/compare/figures.ts';
import { significant } from '../../wording/digits.ts';
import { decimalsOfBounds, writeBounds } from '../../wording/estimate.ts';
import { levelInWords, percent, percentBounds } from '../../wording/percent.ts';
import { listed, possessive, probabilityValue } from '../../wording/words.ts';
import type { Reply, Table } from '../reply.ts';
import { framed, placeInWords, windowInWords } from './parts.ts';

export const meanBounds = ({ difference, lower, upper }: CompareFigures) =>
  percentBounds({ estimate: difference, lower, upper });

export const ratioBounds = ({ deviationRatio, ratioLower, ratioUpper }: CompareFigures) => {
  if (deviationRatio === null) return null;
  const bounds = { estimate: deviationRatio, lower: ratioLower, upper: ratioUpper };
  return writeBounds(bounds, decimalsOfBounds(bounds, [1]), { plus: false });
};

const spreadWords = (figures: CompareFigures): string => {
  const bounds = ratioBounds(figures);
  if (bounds === null) return 'volatility is not compared';
  return `volatility ${figures.spreadsDiffer ? 'differs' : 'is not shown to differ'}, by a factor ${placeInWords(bounds, '')}`;
};

/** Who is compared, and whether they are told apart. */
const verdictWords = (answer: CompareAnswer): string => {
  const { kind, order, meansDiffer } = answer.figures;
  const [first, second] = order;
  if (kind === 'paired')
    return `${first} and ${second} ${meansDiffer ? 'differ' : 'do not show a difference'} in mean daily return`;
  const changed = meansDiffer ? 'has changed' : 'is not shown to have changed';
  return `${possessive(answer.subject[0] ?? '')} mean daily return ${changed} ${first}, against ${second}`;
};

const pairTable = ({ figures }: CompareAnswer): Table => {
  const bounds = meanBounds(figures);
  const ratio = ratioBounds(figures);
  const [first, second] = figures.order;
  return {
    columns: [
      { head: '% a day', align: 'left' },
      { head: first, align: 'right' },
      { head: second, align: 'right' },
      { head: 'difference or ratio', align: 'right' },
      { head: 'p', align: 'right' },
    ],
    rows: [
      [
        'Mean',
        percent(figures.firstMean, bounds.decimals, { plus: true }).slice(0, -1),
        percent(figures.secondMean, bounds.decimals, { plus: true }).slice(0, -1),
        `${bounds.estimate}, ${bounds.lower} to ${bounds.upper}`,
        probabilityValue(figures.p),
      ],
      [
        'Standard deviation',
        significant(100 * figures.firstDeviation, 3),
        significant(100 * figures.secondDeviation, 3),
        ratio === null ? '' : `×${ratio.estimate}, ${ratio.lower} to ${ratio.upper}`,
        figures.spreadP === null ? '' : probabilityValue(figures.spreadP),
      ],
    ],
  };
};

/** Two tickers, or two periods of one. */
export const compareReply = (answer: CompareAnswer): Reply => {
  const { figures } = answer;
  const bounds = meanBounds(figures);
  const sentence =
    `${verdictWords(answer)} ${windowInWords(answer)}: ` +
    `at ${levelInWords(figures.confidenceLevel)} the true difference lies ${placeInWords(bounds, '%')}; ${spreadWords(figures)}.`;
  return framed(answer, sentence, {
    table: pairTable(answer),
    figuresInWords: `Difference ${bounds.estimate}%, p ${probabilityValue(figures.p)}`,
  });
};

const pairRow = ({ figures }: CompareAnswer): readonly string[] => {
  const bounds = meanBounds(figures);
  const ratio = ratioBounds(figures);
  return [
    figures.order.join(' − '),
    `${bounds.estimate}, ${bounds.lower} to ${bounds.upper}`,
    figures.holmP === null ? '' : probabilityValue(figures.holmP),
    ratio === null ? '' : `×${ratio.estimate}, ${ratio.lower} to ${ratio.upper}`,
    figures.holmSpreadP === null ? '' : probabilityValue(figures.holmSpreadP),
  ];
};

/** `KELP less TARN +0.1%, p adjusted 0.21`: a pair as it is read out. */
const pairInWords = ({ figures }: CompareAnswer): string => {
  const [one, other] = figures.order;
  const adjusted = figures.holmP === null ? '' : `, p adjusted ${probabilityValue(figures.holmP)}`;
  return `${one} less ${other} ${meanBounds(figures).estimate}%${adjusted}`;
};

/** Every pair of several tickers in one reply, with p-values that hold although all pairs are read at once. */
export const compareManyReply = (answers: readonly [CompareAnswer, ...CompareAnswer[]]): Reply => {
  const [first] = answers;
  const level = first.figures.confidenceLevel;
  const names = [...new Set(answers.flatMap(({ subject }) => subject))];
  const apart = answers
    .filter(({ figures }) => figures.meansDiffer)
    .map(({ figures }) => figures.order.join('–'));
  const spreadApart = answers
    .filter(({ figures }) => figures.spreadsDiffer)
    .map(({ figures }) => figures.order.join('–'));
  const found = (pairs: readonly string[]) => (pairs.length === 0 ? 'no pair' : listed(pairs));
  const sentence =
    `Among ${listed(names)} ${windowInWords(first)}, adjusted for ${answers.length} pairs at ${levelInWords(level)}: ` +
    `mean daily returns differ for ${found(apart)}; volatility differs for ${found(spreadApart)}.`;
  return framed(first, sentence, {
    warnings: [...new Set(answers.flatMap(({ warnings }) => warnings.map(({ text }) => text)))],
    table: {
      columns: [
        { head: 'Pair', align: 'left' },
        { head: 'mean, % a day', align: 'right' },
        { head: 'p, adjusted', align: 'right' },
        { head: 'deviation ratio', align: 'right' },
        { head: 'p, adjusted', align: 'right' },
      ],
      rows: answers.map(pairRow),
    },
    figuresInWords: `Differences of the mean a day: ${answers.map(pairInWords).join('; ')}`,
  });
};
