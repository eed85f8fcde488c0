/**
 * The whole structure of a few small pictures, as it was when somebody had looked at them and found them good. Where one
 * is changed on purpose, look at the new picture (npm run gallery), then write it anew with UPDATE_PICTURES=1 and run npm run format.
 */
import { readFileSync, writeFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { sheetOf } from '../../../src/present/picture/sheetOf.ts';
import { chartOf } from '../../../src/present/picture/toSvg.ts';
import { pictureAsked } from './demoPictures.ts';

const pictures = [
  ['ladder', 'interval KELP 60d'],
  ['claim', 'claim KELP 20bp 60d'],
  ['models', 'tail KELP over 10d by historical'],
] as const;

/** Figures are the same to 1e-12 on every major version of Node; nine digits are more than can be seen. */
const nineDigits = (_: string, value: unknown): unknown =>
  typeof value === 'number' ? Number(value.toPrecision(9)) : value;

test.each(pictures)('%s', (name, question) => {
  const file = new URL(`./golden/${name}.json`, import.meta.url);
  const { panels, ...words } = sheetOf(pictureAsked(question));
  const now = JSON.parse(JSON.stringify({ ...words, chart: chartOf({ panels }) }, nineDigits));
  if (process.env['UPDATE_PICTURES'] === '1') writeFileSync(file, `${JSON.stringify(now, null, 1)}\n`);
  expect(now).toEqual(JSON.parse(readFileSync(file, 'utf8')));
});
