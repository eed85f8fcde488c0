import type { TailAnswer } from '../../answers/answer.ts';
import type { RefusedModel, TailFigures, TailModelFigures } from '../../answers/tail/figures.ts';
import { levelInWords, percent, percentBounds, percentDecimals } from '../../wording/percent.ts';
import { counted, moneyInWords } from '../../wording/words.ts';
import type { Passage, Reply, Table } from '../reply.ts';
import { framed, windowInWords } from './parts.ts';

const unsigned = { plus: false };

/** Which figure speaks first where several models were asked. */
const leadingOrder = ['student', 'historical', 'normal', 'filtered', 'peaks'] as const;

/** The models that gave figures. */
export const given = (models: TailFigures['models']): readonly TailModelFigures[] =>
  models.filter((each): each is TailModelFigures => each.ok);

export const leadingOf = (models: TailFigures['models']): TailModelFigures | null => {
  const found = given(models);
  return (
    leadingOrder
      .map((name) => found.find(({ model }) => model === name))
      .find((each) => each !== undefined) ?? null
  );
};

/** One model can stand twice where its two kinds meet; the kind then tells them apart. */
export const modelName = ({ model, parameters, shortcutVar }: TailModelFigures): string =>
  model === 'filtered'
    ? `filtered, ${String(parameters['kind']) === 'garch' ? 'GARCH' : 'EWMA'}, ${shortcutVar === null ? 'next day' : 'from today on'}`
    : model;

/** Without an interval the error of a simulation rules the digits, and without that three digits stand. */
export const written = (
  estimate: number,
  lower: number | null,
  upper: number | null,
  simulationError: number | null,
) => {
  if (lower !== null || upper !== null) {
    const bounds = { estimate, lower, upper };
    return rangeOf(percentBounds(bounds, percentDecimals(bounds), unsigned));
  }
  if (simulationError === null) return { estimate: percent(estimate).slice(0, -1), range: 'no interval' };
  const decimals = percentDecimals(
    { estimate, lower: estimate - simulationError, upper: estimate + simulationError },
    [],
  );
  return { estimate: percent(estimate, decimals).slice(0, -1), range: 'no interval' };
};

const rangeOf = ({ estimate, lower, upper }: ReturnType<typeof percentBounds>) => ({
  estimate,
  range: upper === null ? `${lower} or more` : lower === null ? `up to ${upper}` : `${lower} to ${upper}`,
});

const moneyCell = (value: number | null, currency: string): string =>
  value === null ? '' : moneyInWords(value, currency);

const modelRow = (figures: TailModelFigures, currency: string | null): readonly string[] => {
  const value = written(
    figures.var,
    figures.varLower,
    figures.varUpper,
    figures.monteCarloError?.var ?? null,
  );
  const shortfall =
    figures.es === null
      ? { estimate: 'none', range: '' }
      : written(figures.es, figures.esLower, figures.esUpper, figures.monteCarloError?.es ?? null);
  const money =
    currency === null ? [] : [moneyCell(figures.varMoney, currency), moneyCell(figures.esMoney, currency)];
  return [modelName(figures), value.estimate, value.range, shortfall.estimate, shortfall.range, ...money];
};

const table = ({ figures }: TailAnswer): Table => {
  const currency = figures.amount?.currency ?? null;
  const interval = `at ${levelInWords(figures.confidenceLevel)}`;
  return {
    columns: [
      {
        head: figures.horizonDays === 1 ? '% a day' : `% over ${counted(figures.horizonDays, 'day')}`,
        align: 'left',
      },
      { head: 'VaR', align: 'right' },
      { head: interval, align: 'right' },
      { head: 'ES', align: 'right' },
      { head: interval, align: 'right' },
      ...(currency === null
        ? []
        : ([
            { head: 'VaR, money', align: 'right' },
            { head: 'ES, money', align: 'right' },
          ] as const)),
    ],
    rows: given(figures.models).map((each) => modelRow(each, currency)),
  };
};

const refusedPassage = (models: readonly (RefusedModel | { readonly ok: true })[]): readonly Passage[] => {
  const lines = models.flatMap((each) => (each.ok ? [] : [`${each.model}: ${each.problem.message}`]));
  return lines.length === 0 ? [] : [{ head: 'Not given', lines }];
};

export { refusedPassage };

/** `3.12% (at 95% 2.61% to 4.05%)`: the VaR with its interval, where there is one. */
export const rangeInWords = (leading: TailModelFigures, level: string): string => {
  const { estimate, range } = written(
    leading.var,
    leading.varLower,
    leading.varUpper,
    leading.monteCarloError?.var ?? null,
  );
  const interval =
    range === 'no interval'
      ? 'no interval can be given'
      : `at ${level} ${range.replace(/(\d)( to |$)/g, '$1%$2')}`;
  return `${estimate}% (${interval})`;
};

const horizonInWords = (days: number): string => (days === 1 ? 'a day' : `${counted(days, 'day')}`);

/** The trade’s shortcut beside the simulated figure, where more than one day was asked. */
const shortcutPassage = (models: readonly TailModelFigures[], days: number): readonly Passage[] => {
  const lines = models.flatMap((each) =>
    each.shortcutVar === null ? [] : [`${modelName(each)}: ${percent(each.shortcutVar)}`],
  );
  return lines.length === 0
    ? []
    : [{ head: `By the shortcut √${days}·(VaR + m) − ${days}·m, trade practice`, lines: [lines.join('; ')] }];
};

const moneyPhrase = ({ figures }: TailAnswer, leading: TailModelFigures): string =>
  figures.amount === null || leading.varMoney === null
    ? ''
    : `, ${moneyInWords(leading.varMoney, figures.amount.currency)} on ${moneyInWords(figures.amount.amount, figures.amount.currency)}`;

/** The loss that is exceeded once in so many days, and how the models spread around it. */
export const tailReply = (answer: TailAnswer): Reply => {
  const { figures, subject } = answer;
  const leading = leadingOf(figures.models);
  const level = levelInWords(figures.tailLevel);
  const short = figures.position === 'short' ? ' short' : '';
  if (leading === null) return framed(answer, `${subject[0] ?? ''}: no tail figure can be given.`, {});
  const all = given(figures.models).map((each) => each.var);
  const spread =
    all.length > 1
      ? `; the models run from ${percent(Math.min(...all))} to ${percent(Math.max(...all))}`
      : '';
  const shortfall = leading.es === null ? '' : `; the average loss beyond it is ${percent(leading.es)}`;
  const window =
    leading.target === 'nextDay'
      ? `${figures.horizonDays === 1 ? 'for the next day' : 'from today on'}, ${windowInWords(answer)}`
      : windowInWords(answer);
  const sentence =
    `${subject[0] ?? ''}${short}: by the ${leading.model} model ${window}, the ${level} VaR of ${horizonInWords(figures.horizonDays)} is ` +
    `${rangeInWords(leading, levelInWords(figures.confidenceLevel))}${moneyPhrase(answer, leading)}${shortfall}${spread}.`;
  return framed(answer, sentence, {
    table: table(answer),
    passages: [
      ...shortcutPassage(given(figures.models), figures.horizonDays),
      ...refusedPassage(figures.models),
    ],
    figuresInWords: given(figures.models)
      .map(
        (each) =>
          `${modelName(each)}: VaR ${percent(each.var)}, ES ${each.es === null ? 'none' : percent(each.es)}`,
      )
      .join('; '),
  });
};
