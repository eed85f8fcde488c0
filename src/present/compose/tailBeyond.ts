import type { TailBeyondAnswer } from '../../answers/answer.ts';
import type { BeyondModelFigures } from '../../answers/tail/figures.ts';
import { significant } from '../../wording/digits.ts';
import { levelInWords, percent, percentBounds, percentDecimals } from '../../wording/percent.ts';
import { counted, listed } from '../../wording/words.ts';
import type { Reply } from '../reply.ts';
import { framed, windowInWords } from './parts.ts';
import { refusedPassage } from './tail.ts';

const mostDaysShown = 10;

const given = ({ figures }: TailBeyondAnswer): readonly BeyondModelFigures[] =>
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
  const loss = percent(figures.threshold);
  const short = figures.position === 'short' ? ' short' : '';
  const chance =
    leading === undefined
      ? ''
      : ` the ${leading.model} model expects it once in ${sessions(leading.meanReturnSessions)} sessions;`;
  const sentence =
    `${answer.subject[0] ?? ''}${short}: a daily loss of ${loss} or more happened on ${figures.days.length} of ${counted(answer.returnCount, 'day')} ` +
    `${windowInWords(answer).startsWith('over ') ? '' : windowInWords(answer)}`.trimEnd() +
    `;${chance} the models run from once in ${sessions(minimum(models))} to once in ${sessions(maximum(models))}.`;
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
