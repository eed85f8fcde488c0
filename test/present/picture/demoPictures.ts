import type { Answers } from '../../../src/answers/answer.ts';
import { type AnswerJob, answerQuestion } from '../../../src/answers/answerQuestion.ts';
import { feedPicture, tickerPicture } from '../../../src/answers/pictures/feedPictures.ts';
import type { DigestPicture, PictureData } from '../../../src/answers/pictures/pictureData.ts';
import { pictureOf } from '../../../src/answers/pictures/pictureOf.ts';
import { readMessage } from '../../../src/questions/readMessage.ts';
import { createVocabulary } from '../../../src/questions/vocabulary.ts';
import { feedOnce } from '../../../src/start/feed.ts';
import { simpleReturns } from '../../../src/stats/returns/returns.ts';
import type { PriceSeries } from '../../../src/terms/prices.ts';
import { isStatistical } from '../../../src/workspaces/questionKinds.ts';
import { exampleSettings } from '../../e2e/demoDesk.ts';
import { accepted } from '../../laws/outcomes.ts';
import { context } from '../../questions/asking.ts';

const feed = await feedOnce(exampleSettings(), { nowMs: () => Date.parse('2026-11-28T08:00:00Z') });
export const snapshot = accepted(feed.snapshot());
const policy = { periodsPerYear: 252, smallestMeanThatMatters: 0.0005 };

export const seriesNamed = (ticker: string): PriceSeries => {
  const series = snapshot.series(ticker);
  if (series === null) throw new Error(`no prices of ${ticker}`);
  return series;
};

type Worked = { readonly job: AnswerJob; readonly answers: Answers };

const workOut = (text: string): Worked => {
  const vocabulary = createVocabulary(snapshot.tickers);
  const [read] = readMessage(text, { ...context, vocabulary }).questions;
  if (read === undefined) throw new Error(`nothing was read in ${text}`);
  const { question, ...more } = accepted(read);
  if (!isStatistical(question)) throw new Error(`no figures are asked in ${text}`);
  const tickers =
    question.verb === 'compare' && question.between === 'tickers' ? question.tickers : [question.ticker];
  const job = { read: { question, ...more }, series: tickers.map(seriesNamed), policy };
  return { job, answers: accepted(answerQuestion(job)) };
};

const known = new Map<string, Worked>();

/** A question about the demonstration prices, worked out once. */
export const worked = (text: string): Worked => {
  const found = known.get(text) ?? workOut(text);
  known.set(text, found);
  return found;
};

export const pictureAsked = (text: string): PictureData => {
  const { job, answers } = worked(text);
  return accepted(pictureOf(job, answers));
};

const reportOf = () => {
  const { report } = feed.feedStatus();
  if (report === null) throw new Error('the demonstration prices were not read');
  return report;
};

export const wholeFeed = (): PictureData => feedPicture(reportOf(), snapshot.series);

export const tickerAsked = (series: PriceSeries): PictureData => {
  const data = tickerPicture(series);
  if (data === null) throw new Error(`${series.ticker} has no prices`);
  return data;
};

/** A digest of some tickers, with made figures: what is looked at is the picture. */
export const madeDigest = (tickers: readonly string[]): DigestPicture => ({
  kind: 'digest',
  id: 'D-12',
  asOf: '2026-11-27',
  tailLevel: 0.99,
  confidenceLevel: 0.95,
  model: 'student',
  rows: tickers.map((ticker, place) => {
    const returns = [...simpleReturns(seriesNamed(ticker).closes)].slice(-60);
    const value = 0.02 + 0.002 * place;
    return {
      returns,
      line:
        place === 3
          ? { ok: false, ticker, message: 'no figure' }
          : {
              ok: true,
              ticker,
              asOf: 20784,
              lastReturn: returns.at(-1) ?? 0,
              exceeded: place === 1,
              var: value,
              varLower: 0.9 * value,
              varUpper: 1.3 * value,
              es: 1.2 * value,
              esLower: null,
              esUpper: null,
              change: null,
              changeOverHalfWidth: null,
              judged: null,
              notJudged: null,
              tailId: 'R-0000000000',
              backtestId: null,
              warnings: [],
            },
    };
  }),
});

/** One question for each picture that answers have. */
export const askable = [
  'interval KELP 60d',
  'interval KELP above 30d at 99%',
  'interval LIMPET 250d robust',
  'interval vol KELP 3m',
  'interval ratio KELP 1y',
  'claim KELP 20bp 60d',
  'claim KELP ratio 1 a year',
  'need KELP 5bp at 95%',
  'compare KELP TARN 60d',
  'compare KELP TARN BRINE 60d',
  'compare KELP before 2026-05-04',
  'tail KELP at 99%',
  'tail KELP by historical 120d at 99%',
  'tail KELP over 10d by historical',
  'tail KELP on -2m USD by student',
  'tail KELP beyond 2.5%',
  'shape KELP 2y',
  'backtest KELP by normal',
] as const;
