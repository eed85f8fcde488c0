import { simpleReturns } from '../../src/stats/returns/returns.ts';
import { indexCloses } from './readFixture.ts';

/** The last returns of an index, as many as the window of the reference says. */
export const indexReturns = (ticker: string, window: string): Float64Array => {
  const all = simpleReturns(indexCloses(ticker));
  return window === 'all' ? all : all.slice(-Number(window));
};
