import { limits } from '../../limits.ts';
import type { FeedQuestion } from '../../question.ts';
import { attained } from '../faults/fault.ts';
import { settleLevels } from './settle.ts';
import type { VerbReader } from './verbReader.ts';

export const feed: VerbReader = {
  verb: 'feed',
  takes: new Set(['ticker', 'wish']),
  tickers: { least: 0, most: limits.tickersPerQuestion },
  settle: settleLevels,
  read: ({ tickers }) => {
    const asked: readonly (string | null)[] = tickers.length === 0 ? [null] : tickers;
    const questions = asked.map((ticker): FeedQuestion => ({ verb: 'feed', ticker }));
    return attained({ questions, assumed: [] });
  },
};
