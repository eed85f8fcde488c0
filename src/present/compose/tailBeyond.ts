import type { TailBeyondAnswer } from '../../answers/answer.ts';
import type { BeyondModelFigures } from '../../answers/tail/figures.ts';
import { significant } from '../../wording/digits.ts';
import {
  levelInWords,
  percent,
  percentBounds,
  percentDecimals,
  typedPercent,
} from '../../wording/percent.ts';
import { counted, listed } from '../../wording/words.ts';
import type { Reply } from '../reply.ts';
import { framed } from './parts.ts';
import { refusedPassage } from './tail.ts';

const mostDaysShown = 10;

/** The models that gave a chance. */
export const given = ({ figures }: TailBeyondAnswer): readonly BeyondModelFigures[] =>
  figures.models.filter((each): each is BeyondModelFigures => each.ok);

const sessions = (count: number | null): string => (count === null ? 'never' : significant(count, 2));

const row = (each: BeyondModelFigures): readonly string[] => {
  const bounds = { estimate: each.probability, lower: each.lower, upper: each.upper };
  const written = percentBounds(bounds, percentDecimals(bounds), { plus: false });
  return [
    each.target === 'nextDay' ? `${each.model}, next day` : each.model,
    written.estimate,
    `${written.lower ?? '0'} to ${written.upper ?? '100'}`,
    sessions(each.meanReturnSessions),
  ];
};

const once = (count: number | null): string =>
  count === null ? 'never' : `once in ${significant(count, 2)} sessions`;

const chanceWords = (leading: BeyondModelFigures): string =>
  `the ${leading.model} model expects it ${once(leading.meanReturnSessions)}`;

const runWords = (models: readonly BeyondModelFigures[]): string =>
  models.length < 2 ? '' : `, and the models run from ${once(minimum(models))} to ${once(maximum(models))}`;

const daysInWords = (days: readonly string[]): string => {
  if (days.length === 0) return 'It did not happen in the window.';
  const shown = days.slice(-mostDaysShown);
  const more = days.length - shown.length;
  return `It happened on ${listed(shown)}${more > 0 ? ` and ${counted(more, 'day')} before` : ''}.`;
};

/** How rare a daily loss of at least the threshold is. */
export const tailBeyondReply = (answer: TailBeyondAnswer): Reply => {
  const { figures } = answer;
  const models = given(answer);
  const leading = models.find(({ model }) => model === 'student') ?? models[0];
  const short = figures.position === 'short' ? ' short' : '';
  const loss = typedPercent(figures.threshold);
  const happened = `${figures.days.length} of ${counted(answer.returnCount, 'day')}`;
  const sentence =
    `${answer.subject[0] ?? ''}${short}: a daily loss of ${loss} or more happened on ${happened} to ${answer.asOf}; ` +
    (leading === undefined ? 'no model gives its chance.' : `${chanceWords(leading)}${runWords(models)}.`);
  return framed(answer, sentence, {
    table: {
      columns: [
        { head: 'Chance a day, %', align: 'left' },
        { head: 'estimate', align: 'right' },
        { head: `at ${levelInWords(figures.confidenceLevel)}`, align: 'right' },
        { head: 'once in sessions', align: 'right' },
      ],
      rows: models.map(row),
    },
    passages: [{ head: null, lines: [daysInWords(figures.days)] }, ...refusedPassage(figures.models)],
    figuresInWords: models.map((each) => `${each.model}: ${percent(each.probability)}`).join('; '),
  });
};

const spans = (models: readonly BeyondModelFigures[]): readonly (number | null)[] =>
  models.map(({ meanReturnSessions }) => meanReturnSessions);

/** A model that gives it no chance at all makes it rarest: null, "never". */
const maximum = (models: readonly BeyondModelFigures[]): number | null => {
  const all = spans(models);
  return all.includes(null) ? null : Math.max(...all.filter((each) => each !== null));
};

const minimum = (models: readonly BeyondModelFigures[]): number | null => {
  const finite = spans(models).filter((each) => each !== null);
  return finite.length === 0 ? null : Math.min(...finite);
};
