import { feedPicture, tickerPicture } from '../answers/pictures/feedPictures.ts';
import { feedReply, tickerReply } from '../present/compose/feed.ts';
import { pricePicture } from '../present/compose/pricePicture.ts';
import type { ReadQuestion } from '../questions/question.ts';
import type { FeedReport, TickerReport } from '../terms/feedReport.ts';
import type { PriceSnapshot } from '../terms/prices.ts';
import { problem } from '../terms/problem.ts';
import { type Result, refuse } from '../terms/result.ts';
import { refused, type Spoken, said } from './conversation.ts';
import type { Desk } from './desk.ts';
import { pictured } from './pictured.ts';
import type { Picture } from './pictures.ts';

const noPrices = (name: string): Result<Picture> =>
  refuse(problem('feedMissing', `there are no prices of ${name} to draw.`));

const answerWhole = async (
  desk: Desk,
  wanted: boolean,
  report: FeedReport | null,
  live: Result<PriceSnapshot>,
): Promise<Spoken> => {
  const given = said(feedReply(desk.feedStatus(), desk.timeZone));
  if (!wanted || report === null) return given;
  const seriesOf = (ticker: string) => (live.ok ? live.value.series(ticker) : null);
  return pictured(given, await desk.drawing.drawData(feedPicture(report, seriesOf)));
};

const answerTicker = async (
  desk: Desk,
  wanted: boolean,
  report: TickerReport,
  live: Result<PriceSnapshot>,
): Promise<Spoken> => {
  const given = said(tickerReply(report, desk.feedStatus().freshness));
  if (!wanted) return given;
  const series = live.ok ? live.value.series(report.ticker) : null;
  const data = series === null ? null : tickerPicture(series);
  if (series === null || data === null) return pictured(given, noPrices(report.ticker));
  return pictured(given, await desk.drawing.drawData(data), [pricePicture(series)]);
};

/** How fresh and how clean the prices are, of the whole feed or of one ticker, with their picture where it is wanted. */
export const answerFeed = async (
  desk: Desk,
  { wishes }: Pick<ReadQuestion, 'wishes'>,
  ticker: string | null,
  live: Result<PriceSnapshot>,
): Promise<Spoken> => {
  const wanted = wishes.includes('picture');
  const { report } = desk.feedStatus();
  if (ticker === null) return answerWhole(desk, wanted, report, live);
  const found = report?.tickers.find((each) => each.ticker === ticker);
  if (found === undefined)
    return refused(
      refuse(problem('unknownTicker', `${ticker} is not in the feed. Ask feed for the tickers that are.`)),
    );
  return answerTicker(desk, wanted, found, live);
};
