import { expect, test } from 'vitest';
import { worked } from '../../present/picture/demoPictures.ts';

test('a backtest’s working says how often each model is rejected by chance alone', () => {
  const [answer] = worked('backtest KELP 250d at 99% by normal').answers;
  const step = answer.working.find(({ step: name }) => name === 'How often a rejection is chance');
  expect(step?.text).toMatch(
    /250 days judged at 99% from 250 returns each, the coverage test at 5% rejects historical \d+%, normal \d+%, student \d+%, filtered \d+%, peaks \d+% of the time; with the true figure 9%/,
  );
});
