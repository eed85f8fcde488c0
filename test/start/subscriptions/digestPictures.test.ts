import { expect, test } from 'vitest';
import type { PictureData } from '../../../src/answers/pictures/pictureData.ts';
import { createDigestPictures } from '../../../src/start/subscriptions/digestPictures.ts';
import { problem } from '../../../src/terms/problem.ts';
import { refuse, succeed } from '../../../src/terms/result.ts';
import type { DigestLine, DigestPost } from '../../../src/terms/scheduledPosts.ts';
import { seriesOf, wobbling } from '../../answers/madeSeries.ts';
import { layingOut } from '../../doubles/drawing.ts';
import { madeDigest } from '../../present/picture/demoPictures.ts';
import { snapshotOf } from '../../workspaces/madeDesk.ts';

const lines: readonly DigestLine[] = madeDigest(['KELP']).rows.map(({ line }) => line);

const post = (some: readonly DigestLine[]): DigestPost => ({
  kind: 'digest',
  dueMs: null,
  id: 'D-1',
  timeZone: 'UTC',
  tailLevel: 0.99,
  confidenceLevel: 0.95,
  model: 'student',
  window: '500d',
  oldPrices: null,
  skipped: null,
  flags: [],
  lines: some,
  byChance: { exceedances: 0.01, nonGreenZones: null },
});

const setUp = (drawData = layingOut.drawData) => {
  const told: string[] = [];
  const drawn: PictureData[] = [];
  const draw = createDigestPictures({
    drawing: {
      ...layingOut,
      drawData: (data) => {
        drawn.push(data);
        return drawData(data);
      },
    },
    snapshot: () => succeed(snapshotOf([seriesOf('KELP', wobbling(90))])),
    tell: (message) => told.push(message),
  });
  return { draw, drawn, told };
};

test('the last sixty returns up to the day of the line stand beside it', async () => {
  const { draw, drawn, told } = setUp();
  const [line] = lines;
  if (line?.ok !== true) throw new Error('a figure is needed');
  // 2026-11-26 is day 20783: the last close, of the 27th, is not yet in the digest
  const picture = await draw(post([{ ...line, asOf: 20783 }]));
  expect(picture?.altText).toContain('One strip for each of 1 ticker');
  const [data] = drawn;
  if (data?.kind !== 'digest') throw new Error('no digest was drawn');
  expect(data.rows[0]?.returns).toHaveLength(60);
  // closes wobble up 1% and down 0.5% in turn; the last of ninety falls on the 27th and rose
  expect(data.rows[0]?.returns.at(-1)).toBeCloseTo(-0.005, 12); // one rounding of a quotient
  expect(data.asOf).toBe('2026-11-26');
  expect(told).toEqual([]);
});

test('a digest without any figure has no picture', async () => {
  const { draw, drawn } = setUp();
  expect(await draw(post([{ ok: false, ticker: 'KELP', message: 'too short' }]))).toBeNull();
  expect(drawn).toEqual([]);
});

test.each([
  ['is refused', async () => refuse(problem('tooFewReturns', 'too few.')), 'too few.'],
  ['breaks', () => Promise.reject(new Error('no thread')), 'no thread'],
] as const)('a picture that %s stops no digest, and the operator is told', async (_, drawData, why) => {
  const { draw, told } = setUp(drawData);
  expect(await draw(post(lines))).toBeNull();
  expect(told).toEqual([`The picture of D-1 was not drawn: ${why}`]);
});
