import { tailModels } from '../question.ts';
import type { HelpTopic } from './topic.ts';

/** The parts of the language that several verbs share. */
export const languageTopics: readonly HelpTopic[] = [
  {
    name: 'windows',
    words: ['window', 'history', 'since', 'ytd'],
    title: 'windows: which returns are looked at',
    sentence: 'A window is a number of returns, a stretch of the calendar, or everything there is.',
    forms: [
      '60d or 60 days: that many returns',
      '12w, 3m, 1y: the returns of that stretch up to the last date in the feed',
      'ytd, all',
      'since DATE',
      '2026-01-02/2026-03-31: both days belong to it',
    ],
    examples: ['interval KELP 12w', 'interval KELP since 2026-01-02', 'interval KELP 2026-01-02/2026-03-31'],
    remarks: [
      '2m is two months, but after on it is two million.',
      '10d is a window, but after over it is a horizon.',
    ],
  },
  {
    name: 'dates',
    words: ['date', 'days'],
    title: 'dates: how a day is written',
    sentence: 'Write year-month-day, or the day with the name of the month, or a day of the week.',
    forms: ['2026-05-04', '4 May, May 4, 4 May 2026', 'monday'],
    examples: ['interval KELP since 4 May', 'interval KELP since monday'],
    remarks: ['Without a year the latest such day before today is taken, and the reply says which.'],
  },
  {
    name: 'levels',
    words: ['level', 'confidence', 'percent'],
    title: 'levels: how sure the answer is to be',
    sentence: 'A level is a percentage under 100%; a higher one gives wider bounds.',
    forms: [
      '95%',
      'at 95',
      'at 0.95',
      'confidence LEVEL: for the interval around a tail figure',
      'power LEVEL: for need',
    ],
    examples: ['interval KELP 60d 99%', 'tail KELP at 99% confidence 90%'],
    remarks: ['A bare 95 is not read: it could be 95% or 95d.', 'A tail level is 50% or more.'],
  },
  {
    name: 'sizes',
    words: ['size', 'amounts', 'amount', 'bp'],
    title: 'sizes and amounts',
    sentence: 'A size is a return in basis points or percent; an amount is money or shares at stake.',
    forms: [
      '20bp, 0.2%; with a year after it: annual',
      'on 2m USD, on 500k, on 500 shares; negative is short',
    ],
    examples: ['claim KELP 0.2% at 95%', 'tail KELP on 500k'],
    remarks: ['Without a currency the ticker’s own is meant.'],
  },
  {
    name: 'pictures',
    words: ['picture', 'chart', 'charts', 'graph', 'plot'],
    title: 'pictures: as picture after a question',
    sentence:
      'The answer comes as always, with a picture below it; the button Picture draws that of an answer that stands already.',
    forms: [
      'interval, claim, compare: intervals as bars, with zero and what is claimed marked',
      'tail: the returns with both fits, the loss side magnified, VaR and ES of each model with their intervals',
      'shape: each return against the one expected by the bell curve and by the fitted t',
      'need: the width of the interval against the number of days',
      'backtest: the returns against the figure of each day, and the count of exceedances against its band',
      'feed: which days have prices, and where they lack',
    ],
    examples: ['interval KELP 60d as picture', 'tail KELP at 99% as picture', 'feed as picture'],
    remarks: ['What is to be seen is also said in words, for whoever cannot see it.'],
  },
  {
    name: 'typing',
    words: ['words', 'grammar', 'language'],
    title: 'typing: what else there is to know',
    sentence: 'One verb a line, the rest in any order, in capitals or not.',
    forms: [
      'log: log returns; as picture, as json: another form of the answer',
      `by MODEL: ${tailModels.join(', ')}`,
      '`ALL`: a ticker that is also a word of the language stands in back-ticks',
    ],
    examples: ['interval KELP TARN 60d as json', 'tail KELP by peaks log'],
    remarks: [
      'Several tickers after a verb that takes one are several questions, 5 at most; further lines that begin with a verb are answered too, 3 in all.',
      'VaR and ES read as tail, a leading vol as interval vol.',
    ],
  },
];
