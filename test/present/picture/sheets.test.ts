import { describe, expect, test } from 'vitest';
import { answersReply } from '../../../src/present/answerReply.ts';
import { sheetWidth } from '../../../src/present/picture/look.ts';
import type { Sheet } from '../../../src/present/picture/sheet.ts';
import { sheetOf } from '../../../src/present/picture/sheetOf.ts';
import { toSvg } from '../../../src/present/picture/toSvg.ts';
import {
  askable,
  madeDigest,
  pictureAsked,
  seriesNamed,
  snapshot,
  tickerAsked,
  wholeFeed,
  worked,
} from './demoPictures.ts';

const sizeOf = (svg: string) => {
  const [, width, height] = /^<svg[^>]* width="(\d+)" height="(\d+)"/.exec(svg) ?? [];
  return { width: Number(width), height: Number(height) };
};

/** What must hold of every picture, whatever it shows. */
const soundPicture = async (sheet: Sheet): Promise<void> => {
  const svg = await toSvg(sheet);
  // The chart may not be wider than the sheet: the sheet would grow with it.
  expect(sizeOf(svg).width).toBe(sheetWidth);
  expect(sizeOf(svg).height).toBeLessThanOrEqual(800);
  expect(`${svg}${JSON.stringify(sheet)}`).not.toMatch(/NaN|undefined|Infinity/);
  expect(sheet.altText.length).toBeGreaterThan(80);
  // A hyphen before a digit would be a minus that is none.
  expect(`${sheet.title} ${sheet.lines.join(' ')} ${sheet.altText}`).not.toMatch(/(^|[\s(])-\d/);
  expect(svg).not.toMatch(/>-\d/);
};

describe('the picture of an answer', () => {
  test.each(askable)('%s', async (text) => {
    const sheet = sheetOf(pictureAsked(text));
    const { answers } = worked(text);
    await soundPicture(sheet);
    expect(sheet.altText).toContain(answersReply(answers).sentence);
    expect(sheet.corners).toEqual([`Data to ${answers[0].asOf}`, answers[0].id]);
    expect(sheet.fileName).toMatch(/^[\w.-]+\.png$/);
  });
});

test('the feed, a ticker and a digest', async () => {
  await soundPicture(sheetOf(wholeFeed()));
  await soundPicture(sheetOf(tickerAsked(seriesNamed('KELP'))));
  await soundPicture(sheetOf(madeDigest(snapshot.tickers)));
});

test('the same picture is the same text, twice', async () => {
  const sheet = sheetOf(pictureAsked('interval KELP 60d'));
  expect(await toSvg(sheet)).toBe(await toSvg(sheet));
});

describe('what is said to who cannot see it', () => {
  test('the ladder names each bar with the figures beside it', () => {
    const { altText } = sheetOf(pictureAsked('interval KELP 60d'));
    expect(altText).toContain('95% −0.17 to +0.34%;');
    expect(altText).toMatch(/120 days ± 0\.18%; 240 days ± 0\.13%; 600 days ± 0\.079%\.$/);
  });

  test('the backtest says where the count ends in its band, and the worst day', () => {
    const { altText } = sheetOf(pictureAsked('backtest KELP by normal'));
    expect(altText).toMatch(/The count ends at \d+, (inside|above|below) the band of 1 to 10 /);
    expect(altText).toMatch(/The largest marked loss is [\d.]+% on \d{4}-\d\d-\d\d\./);
  });

  test('the feed names who ends early, the gaps, and who is held back', () => {
    const data = wholeFeed();
    if (data.kind !== 'feed') throw new Error(data.kind);
    const [first, second, ...others] = data.rows;
    if (first === undefined || second === undefined) throw new Error('two tickers are needed');
    const early = { ...first, covered: first.covered.map(({ from, to }) => ({ from, to: to - 30 })) };
    const held = { ...second, state: 'heldBack' as const };
    const torn = {
      ...others[0],
      ticker: 'TORN',
      state: 'served' as const,
      covered: first.covered,
      gaps: [{ from: 20000, to: 20020 }],
    };
    const { altText } = sheetOf({ ...data, rows: [early, held, torn] });
    expect(altText).toContain(`${first.ticker} ends earlier`);
    expect(altText).toContain('1 gap of more than five calendar days, in TORN.');
    expect(altText).toContain(`Held back: ${second.ticker}.`);
  });

  test('a digest says who exceeded, and who has no figure', () => {
    const { altText } = sheetOf(madeDigest(['KELP', 'TARN', 'BRINE', 'DULSE']));
    expect(altText).toMatch(/TARN VaR 2\.20%, 1\.98 to 2\.86, last return [+−][\d.]+%, which exceeded/);
    expect(altText).toContain('Without a figure: DULSE.');
  });
});
