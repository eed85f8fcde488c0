import { levelText } from '../../../terms/level.ts';
import type { Schedule, ScheduleDays } from '../../../terms/subscriptions.ts';
import { windowText } from '../../../terms/window.ts';
import { clockText } from '../../../terms/zonedTime.ts';
import type { DigestChange, DigestQuestion, WatchQuestion } from '../../question.ts';
import { weekdayWord } from '../recognisers/calendarWords.ts';
import { writeFraction } from './writeFigures.ts';
import { writeTicker } from './writeTicker.ts';

type Words = readonly string[];

const daysText = (days: ScheduleDays): string => {
  switch (days.kind) {
    case 'on':
      return days.weekdays.map(weekdayWord).join(',');
    case 'monthStart':
      return 'month start';
    case 'monthEnd':
      return 'month end';
    default:
      return days.kind;
  }
};

/** `sessions 08:30 Europe/London`. */
export const writeSchedule = ({ days, minutes, timeZone }: Schedule): string =>
  `${daysText(days)} ${clockText(minutes)} ${timeZone}`;

const or = <Value>(value: Value | null, write: (given: Value) => string): string =>
  value === null ? '' : write(value);

const changeWords = (change: DigestChange): Words => [
  or(change.days, daysText),
  or(change.minutes, clockText),
  change.timeZone ?? '',
  ...change.tickers.map(writeTicker),
  or(change.window, windowText),
  or(change.tailLevel, (level) => `at ${levelText(level)}`),
  or(change.model, (model) => `by ${model}`),
];

/** A digest in its fixed order; `subject` is its tickers or its id. */
export const digestWords = (question: DigestQuestion, subject: string): Words => {
  switch (question.do) {
    case 'add':
      return [
        'digest',
        writeSchedule(question.schedule),
        subject,
        windowText(question.window),
        `at ${levelText(question.tailLevel)}`,
        `by ${question.model}`,
      ];
    case 'list':
      return ['digest', 'list'];
    case 'change':
      return ['digest', 'change', subject, ...changeWords(question.change)];
    default:
      return ['digest', question.do, subject];
  }
};

const watchedWord = { var: 'tail', es: 'es', loss: 'loss beyond tail' } as const;

/** A watch around the words of the tail question behind it, whose first word is the verb. */
export const watchWords = (question: WatchQuestion, subject: string, tailWords: Words): Words => {
  if (question.do === 'list') return ['watch', 'list'];
  if (question.do !== 'add') return ['watch', question.do, subject];
  const line = or(question.crossing, ({ side, fraction }) => `${side} ${writeFraction(fraction)}`);
  // a loss is always of one day
  const rest = tailWords.slice(1).filter((word) => question.watched !== 'loss' || !word.startsWith('over '));
  return ['watch', watchedWord[question.watched], ...rest, line];
};
