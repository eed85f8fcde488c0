import type { CoverageRow, FeedPicture } from '../../../answers/pictures/pictureData.ts';
import { isoFromDay } from '../../../terms/day.ts';
import { counted, listed } from '../../../wording/words.ts';
import { coveragePanel } from '../panels/prices.ts';
import type { Sheet } from '../sheet.ts';
import { altText } from './parts.ts';

const mostNamed = 5;

const named = (rows: readonly CoverageRow[]): string =>
  rows.length <= mostNamed
    ? listed(rows.map(({ ticker }) => ticker))
    : `${listed(rows.slice(0, mostNamed).map(({ ticker }) => ticker))} and ${counted(rows.length - mostNamed, 'more ticker', 'more tickers')}`;

const gapsInWords = (rows: readonly CoverageRow[]): string => {
  const torn = rows.filter(({ gaps }) => gaps.length > 0);
  const count = torn.reduce((sum, { gaps }) => sum + gaps.length, 0);
  return torn.length === 0
    ? 'No ticker has more than five calendar days between two prices.'
    : `${counted(count, 'gap')} of more than five calendar days, in ${named(torn)}.`;
};

const heldBackInWords = (rows: readonly CoverageRow[]): string => {
  const held = rows.filter(({ state }) => state === 'heldBack');
  return held.length === 0 ? '' : `Held back: ${named(held)}.`;
};

const spansInWords = (rows: readonly CoverageRow[]): string => {
  const served = rows.filter(({ covered }) => covered.length > 0);
  const firsts = served.map(({ covered }) => Math.min(...covered.map(({ from }) => from)));
  const lasts = served.map(({ covered }) => Math.max(...covered.map(({ to }) => to)));
  if (firsts.length === 0) return 'No ticker has a price.';
  const late = served.filter((_, place) => (lasts[place] ?? 0) < Math.max(...lasts));
  return (
    `Prices from ${isoFromDay(Math.min(...firsts))} to ${isoFromDay(Math.max(...lasts))}` +
    `${late.length === 0 ? '' : `; ${named(late)} end${late.length === 1 ? 's' : ''} earlier`}.`
  );
};

/** Which days the feed has prices for, ticker by ticker. */
export const feedSheet = ({ rows, more, asOf, fingerprint }: FeedPicture): Sheet => {
  const key = [
    'Blue: prices',
    'tall marks: gaps of more than five days',
    ...(rows.some(({ state }) => state === 'heldBack') ? ['dotted: held back'] : []),
  ].join('; ');
  const rest = more === 0 ? '' : `${counted(more, 'ticker')} with fewer gaps not shown.`;
  return {
    title: 'What the feed covers',
    lines: [`${key}.`, ...(rest === '' ? [] : [rest])],
    panels: [coveragePanel(rows)],
    corners: [`Data to ${asOf}`, fingerprint],
    fileName: `feed-${asOf}.png`,
    altText: altText([
      `Coverage of ${counted(rows.length, 'ticker')}, one line each.`,
      spansInWords(rows),
      gapsInWords(rows),
      heldBackInWords(rows),
      rest,
    ]),
  };
};
