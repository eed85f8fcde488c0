import type { Answer } from '../../answers/answer.ts';
import type { Bounds } from '../../answers/interval/figures.ts';
import type { WrittenBounds } from '../../wording/estimate.ts';
import { counted } from '../../wording/words.ts';
import { type Button, caution, type Reply, reply } from '../reply.ts';
import { levelButtons } from './levels.ts';

const unitWords = { d: 'day', w: 'week', m: 'month', y: 'year' } as const;
type UnitLetter = keyof typeof unitWords;

/** The window as it stands in a sentence: `over 60 days`, `since 2026-05-04`. Counts in days are the returns really used. */
export const windowInWords = (answer: Pick<Answer, 'window' | 'returnCount'>): string => {
  const { asked, from, to } = answer.window;
  const days = counted(answer.returnCount, 'day');
  const span = /^(\d+)([dwmy])$/.exec(asked);
  if (span !== null) {
    const letter = span[2] as UnitLetter;
    return letter === 'd' ? `over ${days}` : `over ${counted(Number(span[1]), unitWords[letter])} (${days})`;
  }
  if (asked === 'ytd') return `this year to ${to} (${days})`;
  if (asked === 'all') return `over its whole history of ${days}`;
  return asked.startsWith('since') ? `${asked} (${days})` : `from ${from} to ${to} (${days})`;
};

/** Data date, returns, method, id, and what was assumed. */
const quietLine = (answer: Answer): string => {
  const assumed = answer.assumed.length === 0 ? '' : `. Assumed: ${answer.assumed.join(', ')}`;
  const count = counted(answer.returnCount, `${answer.returnType} return`);
  return `Data to ${answer.asOf}, ${count}, ${answer.method}, ${answer.id}${assumed}`;
};

const buttonsOf = (answer: Answer): readonly Button[] => {
  const { id: answerId, question } = answer;
  return [
    { action: 'working', label: 'Show the working', answerId, question },
    { action: 'more', label: 'More figures', answerId, question },
    { action: 'picture', label: 'Picture', answerId, question },
    { action: 'pin', label: 'Pin to the thread', answerId, question },
    ...levelButtons(answer),
  ];
};

/** Where the whole of a long answer stands. */
export const onRecord = ({ id }: Pick<Answer, 'id'>): string => `the whole is on record as ${id}`;

/** The frame that every answer's reply has: warnings, quiet line, caution and buttons around its own sentence and table. */
export const framed = (
  answer: Answer,
  sentence: string,
  parts: Partial<Omit<Reply, 'kind' | 'sentence'>>,
): Reply =>
  reply('answer', sentence, {
    warnings: answer.warnings.map(({ text }) => text),
    quietLine: quietLine(answer),
    caution,
    buttons: buttonsOf(answer),
    whole: onRecord(answer),
    ...parts,
  });

/** `+0.06 (+15)`: the daily figure and the annual one in one cell; an open end is said. */
export const dailyAndAnnual = (daily: string | null, annual: string | null): string =>
  daily === null ? 'no bound' : annual === null ? daily : `${daily} (${annual})`;

/** `between −0.21% and +0.34%`, or the one bound that there is. */
export const placeInWords = ({ lower, upper }: WrittenBounds, unit: string): string => {
  if (lower === null) return `below ${upper}${unit}`;
  return upper === null ? `above ${lower}${unit}` : `between ${lower}${unit} and ${upper}${unit}`;
};

/** What the bounds say about zero. */
export const againstZero = ({ lower, upper }: Bounds): string => {
  if (lower !== null && lower > 0) return 'above zero';
  if (upper !== null && upper < 0) return 'below zero';
  return 'not distinguishable from zero';
};
