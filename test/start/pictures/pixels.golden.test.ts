/**
 * What a few pictures look like, against files that were looked at. Letters and lines may differ by the smoothing of their
 * edges between versions of the rasteriser, so what is compared is the mean difference over squares of 12 pixels; a label
 * that moved, or a line that is missing, changes a square by far more.
 */
import { readFileSync, writeFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { sheetOf } from '../../../src/present/picture/sheetOf.ts';
import { toSvg } from '../../../src/present/picture/toSvg.ts';
import { toPixels, toPng } from '../../../src/start/pictures/png.ts';
import { pictureAsked } from '../../present/picture/demoPictures.ts';

type Pixels = ReturnType<typeof toPixels>;

const side = 12;
/** Out of 255, as a mean over the three colours of a square. */
const tolerance = 6;

/** The rasteriser itself reads the file: it stands in a picture of the same size. */
const pixelsOf = (file: URL, { width, height }: Pixels): Pixels => {
  const data = readFileSync(file).toString('base64');
  const image = `<image x="0" y="0" width="${width / 1.5}" height="${height / 1.5}" href="data:image/png;base64,${data}"/>`;
  return toPixels(
    `<svg xmlns="http://www.w3.org/2000/svg" width="${width / 1.5}" height="${height / 1.5}">${image}</svg>`,
  );
};

const differenceIn = (one: Pixels, other: Pixels, left: number, top: number): number => {
  let sum = 0;
  for (let y = top; y < top + side; y += 1)
    for (let x = left; x < left + side; x += 1)
      for (let colour = 0; colour < 3; colour += 1) {
        const place = 4 * (y * one.width + x) + colour;
        sum += Math.abs((one.pixels[place] ?? 0) - (other.pixels[place] ?? 0));
      }
  return sum / (3 * side * side);
};

const largestDifference = (one: Pixels, other: Pixels): number => {
  let largest = 0;
  for (let top = 0; top + side <= one.height; top += side)
    for (let left = 0; left + side <= one.width; left += side)
      largest = Math.max(largest, differenceIn(one, other, left, top));
  return largest;
};

const svgOf = (question: string): Promise<string> => toSvg(sheetOf(pictureAsked(question)));

test.each([
  ['ladder', 'interval KELP 60d'],
  ['shape', 'shape KELP 2y'],
] as const)('%s', async (name, question) => {
  const file = new URL(`./golden/${name}.png`, import.meta.url);
  const svg = await svgOf(question);
  if (process.env['UPDATE_PICTURES'] === '1') writeFileSync(file, toPng(svg));
  const now = toPixels(svg);
  const then = pixelsOf(file, now);
  expect([then.width, then.height]).toEqual([now.width, now.height]);
  expect(largestDifference(now, then)).toBeLessThan(tolerance);
});

test('a picture of another answer is told apart', async () => {
  const [one, other] = await Promise.all([svgOf('interval KELP 60d'), svgOf('interval TARN 60d')]);
  expect(largestDifference(toPixels(one), toPixels(other))).toBeGreaterThan(5 * tolerance);
});
