import type { NotAskedTopic } from './topic.ts';

/** What people ask for that is not answered, with what comes nearest. */
export const notAskedTopics: readonly NotAskedTopic[] = [
  {
    name: 'correlation',
    words: ['correlate', 'correlated', 'corr', 'beta', 'covariance'],
    nearestVerb: 'compare',
    title: 'correlation: not answered',
    sentence: 'Correlation is not answered.',
    nearest: 'The nearest is compare, which says whether two tickers differ on the dates they share.',
    forms: ['compare TICKER TICKER [window]'],
    examples: ['compare KELP TARN 60d'],
    remarks: [],
  },
  {
    name: 'prices',
    words: ['price', 'live', 'live prices', 'live price', 'quote', 'quotes'],
    nearestVerb: 'feed',
    title: 'live prices: not answered',
    sentence: 'Live prices are not answered.',
    nearest:
      'There are only the daily closes of the desk’s own file; the nearest is feed, which says how fresh they are.',
    forms: ['feed TICKER'],
    examples: ['feed KELP'],
    remarks: [],
  },
  {
    name: 'direction',
    words: [
      'forecast',
      'forecasts',
      'predict',
      'prediction',
      'target',
      'buy',
      'sell',
      'up',
      'down',
      'tomorrow',
    ],
    nearestVerb: 'interval',
    title: 'direction: not answered',
    sentence: 'Where a price will go is not answered.',
    nearest: 'The nearest is interval, which says how much the past returns tell about their mean.',
    forms: ['interval TICKER [window]'],
    examples: ['interval KELP 60d'],
    remarks: ['The answer to interval also gives the range in which one more day like these would fall.'],
  },
];
