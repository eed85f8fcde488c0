/**
 * Question to rendered reply, without the platform, on the demonstration prices.
 * Goals (p50): `interval KELP 60d` under 0.5 ms where no bootstrap is called for, under 15 ms where one is (9,999
 * resamples); `tail KELP` with five models and all intervals on 500 returns under 150 ms. Start to ready under 1.5 s.
 */
import { bench, describe } from 'vitest';
import { toBlocks } from '../../src/present/blocks.ts';
import { run } from '../e2e/ask/run.ts';
import { demoConverse } from '../e2e/demoDesk.ts';

const converse = await demoConverse(false);
const keeping = await demoConverse();

const answer = async (text: string, asked = converse): Promise<void> => {
  for (const { reply } of await asked.ask({ text, place: 'channel' })) toBlocks(reply);
};

describe('question to rendered reply', () => {
  bench('interval KELP 60d: goal 0.5 ms', () => answer('interval KELP 60d'), { time: 1000 });
  bench('interval KELP 60d robust, with a bootstrap: goal 15 ms', () => answer('interval KELP 60d robust'), {
    time: 2000,
  });
  bench('interval KELP 60d, kept on record in memory', () => answer('interval KELP 60d', keeping), {
    time: 1000,
  });
  bench('compare KELP TARN 60d', () => answer('compare KELP TARN 60d'), { time: 1000 });
  bench('tail KELP, five models: goal 150 ms', () => answer('tail KELP'), { time: 3000 });
  bench('shape KELP', () => answer('shape KELP'), { time: 2000 });
  bench('backtest KELP, 500 days', () => answer('backtest KELP'), { time: 3000 });
});

describe('start', () => {
  bench(
    'from the command line to the last of three answers: goal 1.5 s to ready',
    async () => {
      await run('serve', []);
    },
    { iterations: 5, time: 0, warmupIterations: 0, warmupTime: 0 },
  );
});
