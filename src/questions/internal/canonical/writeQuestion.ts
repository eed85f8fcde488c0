import { isoFromDay } from '../../../terms/day.ts';
import { levelText } from '../../../terms/level.ts';
import { windowText } from '../../../terms/window.ts';
import type {
  BacktestQuestion,
  ClaimQuestion,
  CompareQuestion,
  IntervalQuestion,
  NeedQuestion,
  Question,
  RecordsQuestion,
  Sample,
  ShapeQuestion,
  SubscriptionQuestion,
  TailQuestion,
} from '../../question.ts';
import { writeExposure, writeFraction, writeRatio, writeSize } from './writeFigures.ts';
import { digestWords, watchWords } from './writeSubscription.ts';
import { writeTicker } from './writeTicker.ts';

/** Words of a question in their fixed order; empty ones fall away. */
type Words = readonly string[];

const when = (condition: boolean, word: string): string => (condition ? word : '');

const window = (sample: Pick<Sample, 'window'>): string => windowText(sample.window);

const log = ({ returnType }: Pick<Sample, 'returnType'>): string => when(returnType === 'log', 'log');

const interval = (question: IntervalQuestion, subject: string): Words => [
  'interval',
  when(question.of !== 'mean', question.of),
  subject,
  window(question),
  `at ${levelText(question.level)}`,
  when(question.side !== 'both', question.side),
  when(question.robust, 'robust'),
  when(question.annual, 'a year'),
  log(question),
];

const claim = (question: ClaimQuestion, subject: string): Words => [
  'claim',
  when(question.of === 'ratio', 'ratio'),
  subject,
  question.of === 'ratio' ? writeRatio(question.claimed) : writeSize(question.claimed),
  window(question),
  `at ${levelText(question.level)}`,
  when(question.side !== 'both', question.side),
  when(question.robust, 'robust'),
  log(question),
];

const need = (question: NeedQuestion, subject: string): Words => [
  'need',
  subject,
  writeSize(question.size),
  window(question),
  `at ${levelText(question.level)}`,
  `power ${levelText(question.power)}`,
  log(question),
];

const compare = (question: CompareQuestion, subject: string): Words => [
  'compare',
  subject,
  question.between === 'periods' ? `before ${isoFromDay(question.splitDay)}` : '',
  window(question),
  `at ${levelText(question.level)}`,
  log(question),
];

const tail = (question: TailQuestion, subject: string): Words => [
  'tail',
  subject,
  question.beyond === null ? '' : `beyond ${writeFraction(question.beyond)}`,
  window(question),
  when(question.beyond === null, `at ${levelText(question.tailLevel)}`),
  `confidence ${levelText(question.confidence)}`,
  when(question.beyond === null, `over ${question.horizonDays}d`),
  question.exposure === null ? '' : writeExposure(question.exposure),
  question.model === null ? '' : `by ${question.model}`,
  log(question),
];

const shape = (question: ShapeQuestion, subject: string): Words => [
  'shape',
  subject,
  window(question),
  `confidence ${levelText(question.confidence)}`,
  log(question),
];

const backtest = (question: BacktestQuestion, subject: string): Words => [
  'backtest',
  subject,
  window(question),
  `at ${levelText(question.tailLevel)}`,
  `on window ${question.estimationReturns}d`,
  question.model === null ? '' : `by ${question.model}`,
  log(question),
];

const records = (question: RecordsQuestion, subject: string): Words => [
  'records',
  subject,
  question.since === null ? '' : `since ${isoFromDay(question.since)}`,
  when(question.verify, 'verify'),
];

const subjectOfSubscription = (question: SubscriptionQuestion): string => {
  if (question.do === 'list') return '';
  if (question.do !== 'add') return question.id;
  return question.verb === 'digest'
    ? question.tickers.map(writeTicker).join(' ')
    : writeTicker(question.tail.ticker);
};

const subscription = (question: SubscriptionQuestion, subject: string): Words =>
  question.verb === 'digest'
    ? digestWords(question, subject)
    : watchWords(question, subject, question.do === 'add' ? tail(question.tail, subject) : []);

/** The tickers or ids that a question is about, as the question writes them. */
export const subjectText = (question: Question): string => {
  if (question.verb === 'help') return question.topic ?? '';
  if (question.verb === 'again') return question.ids.join(' ');
  if (question.verb === 'digest' || question.verb === 'watch') return subjectOfSubscription(question);
  if ('id' in question) return question.id ?? '';
  if (question.verb === 'compare' && question.between === 'tickers')
    return question.tickers.map(writeTicker).join(' ');
  return question.ticker === null ? '' : writeTicker(question.ticker);
};

const wordsOf = (question: Question, subject: string): Words => {
  switch (question.verb) {
    case 'interval':
      return interval(question, subject);
    case 'claim':
      return claim(question, subject);
    case 'need':
      return need(question, subject);
    case 'compare':
      return compare(question, subject);
    case 'tail':
      return tail(question, subject);
    case 'shape':
      return shape(question, subject);
    case 'backtest':
      return backtest(question, subject);
    case 'records':
      return records(question, subject);
    case 'digest':
    case 'watch':
      return subscription(question, subject);
    case 'again':
    case 'pin':
    case 'unpin':
    case 'feed':
    case 'help':
      return [question.verb, subject];
  }
};

/** The question about `subject`, written out in its fixed order. */
export const writeQuestion = (question: Question, subject: string): string =>
  wordsOf(question, subject)
    .filter((word) => word !== '')
    .join(' ');
