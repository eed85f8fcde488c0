import type { BacktestAnswer } from '../../answers/answer.ts';
import type { JudgedModel } from '../../answers/backtest/figures.ts';
import { significant, threeDigits } from '../../wording/digits.ts';
import { levelInWords } from '../../wording/percent.ts';
import { listed, probabilityValue } from '../../wording/words.ts';
import type { Passage, Reply, Table } from '../reply.ts';
import { framed, windowInWords } from './parts.ts';
import { refusedPassage } from './tail.ts';

const badBelow = 0.05;
const mostDatesShown = 8;

const judged = ({ figures }: BacktestAnswer): readonly JudgedModel[] =>
  figures.models.filter((each): each is JudgedModel => each.ok);

const orNot = (value: number | null, write: (value: number) => string): string =>
  value === null ? 'not tested' : write(value);

const zoneText = ({ zone, zoneIsOurExtension }: JudgedModel): string =>
  zone === null ? 'none' : zoneIsOurExtension === true ? `${zone}*` : zone;

const table = (answer: BacktestAnswer): Table => ({
  columns: [
    { head: `VaR at ${levelInWords(answer.figures.tailLevel)}`, align: 'left' },
    { head: 'exceeded', align: 'right' },
    { head: 'expected', align: 'right' },
    { head: 'p, count', align: 'right' },
    { head: 'p, clusters', align: 'right' },
    { head: 'zone', align: 'right' },
    { head: 'p, ES', align: 'right' },
    { head: 'loss', align: 'right' },
  ],
  rows: judged(answer).map((each) => [
    each.model,
    String(each.exceedances),
    threeDigits(each.expected),
    probabilityValue(each.binomialP),
    orNot(each.independenceExactP, probabilityValue),
    zoneText(each),
    orNot(each.esP, probabilityValue),
    orNot(each.meanJointLoss, (loss) => significant(loss, 4)),
  ]),
});

/** Too many, too few, or bunched: what the exact tests say at 5%. */
const faultOf = ({
  binomialP,
  exceedances,
  expected,
  independenceExactP,
  esP,
}: JudgedModel): string | null => {
  if (binomialP < badBelow)
    return exceedances > expected ? 'was exceeded too often' : 'was exceeded too seldom';
  if (independenceExactP !== null && independenceExactP < badBelow) return 'was exceeded in clusters';
  return esP !== null && esP < badBelow ? 'understates the losses beyond it' : null;
};

const verdictWords = (models: readonly JudgedModel[]): string => {
  const held = models.filter((each) => faultOf(each) === null).map(({ model }) => model);
  const faults = models.flatMap((each) => {
    const fault = faultOf(each);
    return fault === null ? [] : [`${each.model} ${fault}`];
  });
  const parts = [...(held.length === 0 ? [] : [`nothing speaks against ${listed(held)}`]), ...faults];
  return parts.join('; ');
};

const bestWords = (models: readonly JudgedModel[]): string => {
  const ranked = models.filter((each) => each.meanJointLoss !== null);
  if (ranked.length < 2) return '';
  const best = ranked.reduce((one, other) =>
    (other.meanJointLoss ?? 0) < (one.meanJointLoss ?? 0) ? other : one,
  );
  return ` Over the same days ${best.model} had the lowest loss.`;
};

const datesPassage = (models: readonly JudgedModel[]): readonly Passage[] => {
  const lines = models
    .filter(({ exceedanceDates }) => exceedanceDates.length > 0)
    .map(({ model, exceedanceDates }) => {
      const shown = exceedanceDates.slice(-mostDatesShown);
      const more = exceedanceDates.length - shown.length;
      return `${model}: ${more > 0 ? `${more} earlier, ` : ''}${shown.join(', ')}`;
    });
  return lines.length === 0 ? [] : [{ head: 'Exceeded on', lines }];
};

const extensionPassage = (models: readonly JudgedModel[]): readonly Passage[] =>
  models.some(({ zoneIsOurExtension }) => zoneIsOurExtension === true)
    ? [
        {
          head: null,
          lines: ['* The zones are the supervisor’s for 250 days at 99%; here they are our extension.'],
        },
      ]
    : [];

/** Did it hold up? */
export const backtestReply = (answer: BacktestAnswer): Reply => {
  const models = judged(answer);
  const sentence =
    `${answer.subject[0] ?? ''}, VaR at ${levelInWords(answer.figures.tailLevel)} judged ${windowInWords(answer)}: ${verdictWords(models)}.` +
    bestWords(models);
  return framed(answer, sentence, {
    table: table(answer),
    passages: [
      ...datesPassage(models),
      ...extensionPassage(models),
      ...refusedPassage(answer.figures.models),
    ],
    figuresInWords: models
      .map(
        ({ model, exceedances, expected }) =>
          `${model}: ${exceedances} exceedances, ${threeDigits(expected)} expected`,
      )
      .join('; '),
  });
};
