import type { VerbTopic } from './topic.ts';

/** The verbs about the mean and the spread. */
export const figureTopics: readonly VerbTopic[] = [
  {
    name: 'interval',
    words: ['mean', 'vol', 'ratio', 'interval vol', 'interval ratio'],
    title: 'interval: where the true figure can lie',
    sentence: 'Says between which bounds the true mean daily return can lie, given how few days were seen.',
    forms: [
      'interval TICKER [window] [at LEVEL] [above | below] [robust] [a year] [log]',
      'interval vol TICKER …: the standard deviation instead of the mean',
      'interval ratio TICKER …: the mean over the standard deviation; nothing risk-free is deducted',
    ],
    examples: ['interval KELP 60d at 95%', 'interval vol KELP 3m', 'interval ratio KELP 1y a year'],
    remarks: [
      'above gives a lower bound only, below an upper bound only.',
      'robust puts the interval first that holds when one day depends on the day before.',
    ],
  },
  {
    name: 'claim',
    words: ['claims'],
    title: 'claim: does the data bear it out?',
    sentence: 'Says whether the returns agree with a stated mean or ratio, contradict it, or cannot tell.',
    forms: [
      'claim TICKER SIZE [a year] [window] [at LEVEL] [above | below] [robust] [log]',
      'claim ratio TICKER NUMBER [a year] …: a stated ratio of the mean to the standard deviation',
    ],
    examples: ['claim KELP 20bp 60d', 'claim KELP 15% a year', 'claim ratio KELP 1.2 a year 2y'],
    remarks: ['With two percentages in the line, put at before the level.'],
  },
  {
    name: 'need',
    words: ['power', 'sample size'],
    title: 'need: how many days until one could tell',
    sentence:
      'Says how many daily returns it takes to know the mean to within a size, or to find a difference of that size.',
    forms: ['need TICKER SIZE [a year] [window] [at LEVEL] [power LEVEL] [log]'],
    examples: ['need KELP 5bp at 95%', 'need KELP 10% a year power 90%'],
    remarks: ['The window is the one from which the spread of the returns is taken.'],
  },
  {
    name: 'compare',
    words: ['difference', 'periods'],
    title: 'compare: two tickers, or before and after a day',
    sentence:
      'Says whether the mean and the spread of the returns differ by more than chance would make them.',
    forms: [
      'compare TICKER TICKER [more tickers, 5 at most] [window] [at LEVEL] [log]',
      'compare TICKER before DATE [window] [at LEVEL] [log]',
    ],
    examples: [
      'compare KELP TARN 60d',
      'compare KELP before 2026-05-04',
      'compare KELP before 4 May 2y at 99%',
    ],
    remarks: [
      'Tickers are compared on the dates they share. With three or more every pair is tested, and the tests allow for their number.',
      'before leaves the day itself to the second period.',
    ],
  },
];
