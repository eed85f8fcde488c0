import { describe, expect, test } from 'vitest';
import type { AnswerJob } from '../../src/answers/answerQuestion.ts';
import type { Question, ReadQuestion } from '../../src/questions/question.ts';
import type { Compute } from '../../src/start/compute/compute.ts';
import { seriesOf, wobbling } from '../answers/madeSeries.ts';
import { accepted, refusalCode } from '../laws/outcomes.ts';

const level = { digits: 95, places: 2 };
const sample = { window: { kind: 'all' }, windowAsked: true, returnType: 'simple' } as const;

const read = (question: Question, canonical: string): ReadQuestion => ({
  question,
  canonical,
  assumed: [],
  wishes: [],
  position: { start: 0, end: 0 },
});

const jobOf = (question: Question, canonical: string, closes = wobbling(320)): AnswerJob => ({
  read: read(question, canonical),
  series: [seriesOf('KELP', closes)],
  policy: { periodsPerYear: 252, smallestMeanThatMatters: 0.0005 },
});

const interval: Question = {
  ...sample,
  verb: 'interval',
  of: 'mean',
  ticker: 'KELP',
  level,
  side: 'both',
  robust: true,
  annual: false,
};

const backtest: Question = {
  ...sample,
  verb: 'backtest',
  ticker: 'KELP',
  window: { kind: 'returns', count: 60 },
  tailLevel: level,
  estimationReturns: 250,
  model: 'normal',
};

/** What every place that works out answers must do. */
export const computeContract = (name: string, open: () => Compute): void => {
  describe(name, () => {
    test('the same job has the same answer, to the last bit, each time', async () => {
      const compute = open();
      const job = jobOf(interval, 'interval KELP all at 95% robust');
      const [first, second] = await Promise.all([compute.answer(job), compute.answer(job)]);
      expect(accepted(first)).toEqual(accepted(second));
      expect(accepted(first)[0].kind).toBe('interval mean');
      await compute.close();
    });

    test('a refusal comes back as one', async () => {
      const compute = open();
      const still = jobOf(interval, 'interval KELP all at 95% robust', [5, 5, 5, 5]);
      expect(refusalCode(await compute.answer(still))).toBe('priceDoesNotMove');
      await compute.close();
    });

    test('a long answer says how far it has come', async () => {
      const compute = open();
      const heard: string[] = [];
      const outcome = await compute.answer(jobOf(backtest, 'backtest KELP 60d at 95%'), (words) =>
        heard.push(words),
      );
      expect(accepted(outcome)[0].kind).toBe('backtest');
      expect(heard[0]).toMatch(/^\d+ of \d+ days walked$/);
      await compute.close();
    });
  });
};
