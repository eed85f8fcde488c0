import { describe, expect, test } from 'vitest';
import { type DrawingRoom, drawInline, drawInThread } from '../../../src/start/pictures/draw.ts';
import { accepted } from '../../laws/outcomes.ts';
import { madeDigest, pictureAsked, worked } from '../../present/picture/demoPictures.ts';

/** Threads run the built program. */
const inThread = (): DrawingRoom =>
  drawInThread(new URL('../../../dist/start/pictures/worker.js', import.meta.url));

const pngHead = [0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a];

/** Width and height stand in the first chunk of a PNG (ISO/IEC 15948, 11.2.2), as big-endian numbers. */
const sizeOf = (png: Uint8Array) => {
  const view = new DataView(png.buffer, png.byteOffset);
  return [view.getUint32(16), view.getUint32(20)];
};

describe.each([
  ['on the calling thread', drawInline],
  ['in a thread', inThread],
])('pictures drawn %s', (_, open) => {
  test('answers become a PNG of 720 pixels’ width with its words', async () => {
    const room = open();
    const { job, answers } = worked('interval KELP 60d');
    const picture = accepted(await room.draw(job, answers));
    await room.close();
    expect([...picture.png.slice(0, 8)]).toEqual(pngHead);
    expect(sizeOf(picture.png)[0]).toBe(720);
    expect(picture.title).toBe('KELP’s mean daily return over 60 days');
    expect(picture.fileName).toBe(`interval-KELP-${answers[0].id}.png`);
  });

  test('what was gathered elsewhere is drawn as well', async () => {
    const room = open();
    const picture = accepted(await room.drawData(madeDigest(['KELP', 'TARN'])));
    await room.close();
    expect(sizeOf(picture.png)[0]).toBe(720);
    expect(picture.altText).toContain('One strip for each of 2 tickers');
  });
});

test('a room that never drew closes', async () => {
  await inThread().close();
  expect(pictureAsked('interval KELP 60d').kind).toBe('figures');
});
