/**
 * A picture from its answers to the PNG, in the thread that draws. Goal: under 150 ms once the thread is warm. The first
 * picture also waits for the libraries to load. Run npm run build first: threads run the built program.
 */
import { bench, describe } from 'vitest';
import { drawInThread } from '../../src/start/pictures/draw.ts';
import { accepted } from '../laws/outcomes.ts';
import { madeDigest, snapshot, wholeFeed, worked } from '../present/picture/demoPictures.ts';

const worker = new URL('../../dist/start/pictures/worker.js', import.meta.url);
const warm = drawInThread(worker);
const drawn = ['interval KELP 60d', 'tail KELP at 99%', 'shape KELP 2y', 'backtest KELP by student'].map(
  (question) => ({ question, ...worked(question) }),
);
for (const { job, answers } of [...drawn, ...drawn]) accepted(await warm.draw(job, answers));

describe('a picture in a warm thread: goal 150 ms', () => {
  for (const { question, job, answers } of drawn)
    bench(question, async () => void accepted(await warm.draw(job, answers)), { time: 3000 });
  bench('feed', async () => void accepted(await warm.drawData(wholeFeed())), { time: 3000 });
  bench('digest of 12', async () => void accepted(await warm.drawData(madeDigest(snapshot.tickers))), {
    time: 3000,
  });
});

describe('the first picture', () => {
  bench(
    'interval KELP 60d, with the start of the thread',
    async () => {
      const cold = drawInThread(worker);
      const [first] = drawn;
      if (first !== undefined) accepted(await cold.draw(first.job, first.answers));
      await cold.close();
    },
    { iterations: 5, time: 0, warmupIterations: 0, warmupTime: 0 },
  );
});
