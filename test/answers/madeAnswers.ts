import type { Answer } from '../../src/answers/answer.ts';
import { answerQuestion } from '../../src/answers/answerQuestion.ts';
import { readMessage } from '../../src/questions/readMessage.ts';
import { createVocabulary } from '../../src/questions/vocabulary.ts';
import { nextStudentT } from '../../src/stats/random/studentDraw.ts';
import type { PriceFlag, PriceSeries } from '../../src/terms/prices.ts';
import { isStatistical } from '../../src/workspaces/questionKinds.ts';
import { accepted } from '../laws/outcomes.ts';
import { context } from '../questions/asking.ts';
import { testStreams } from '../stats/testStreams.ts';
import { seriesOf } from './madeSeries.ts';

const policy = { periodsPerYear: 252, smallestMeanThatMatters: 0.0005 };

/** A ticker with these daily returns up to the last day of the demonstration. */
export const seriesFrom = (
  returns: readonly number[],
  flags: readonly PriceFlag[] = [],
  ticker = 'KELP',
): PriceSeries => {
  const closes = [100];
  for (const value of returns) closes.push((closes.at(-1) as number) * (1 + value));
  return { ...seriesOf(ticker, closes), flags };
};

/** Daily returns of the deviation given, by degrees of freedom; the same every time. */
export const drawn = (count: number, size: number, nu: number, stream = 0): readonly number[] => {
  const random = testStreams(8).stream(stream);
  return Array.from({ length: count }, () => size * nextStudentT(random, nu));
};

/** The answer to a question about made prices. */
export const answerTo = (text: string, ...series: readonly PriceSeries[]): Answer => {
  const vocabulary = createVocabulary(series.map(({ ticker }) => ticker));
  const [read] = readMessage(text, { ...context, vocabulary }).questions;
  if (read === undefined) throw new Error(`nothing was read in ${text}`);
  const { question, ...more } = accepted(read);
  if (!isStatistical(question)) throw new Error(`no figures are asked in ${text}`);
  const [answer] = accepted(answerQuestion({ read: { question, ...more }, series, policy }));
  return answer;
};
