import fc from 'fast-check';
import { expect, test } from 'vitest';
import { canonicalText } from '../../src/questions/canonicalText.ts';
import { readMessage } from '../../src/questions/readMessage.ts';
import { isStatistical } from '../../src/workspaces/questionKinds.ts';
import { context, questionIn } from './asking.ts';

const settings = { seed: 20261201, numRuns: 400 };

const before = fc.constantFrom(
  'interval KELP',
  'interval vol TARN 3m log',
  'interval ratio KELP.ONE above',
  'claim KELP 20bp robust',
  'claim ratio KELP 0.1 a year',
  'need `ALL` 5bp power 90%',
  'compare KELP TARN since 2026-05-04',
  'compare KELP before 2026-05-04',
  'tail KELP on -500 shares by student',
  'tail KELP beyond 4%',
  'shape KELP confidence 99%',
  'backtest `M` on window 125d by normal',
);

const word = fc.constantFrom(
  'same',
  'at 99%',
  '97.5%',
  'TARN',
  'KELP',
  '`ALL`',
  '3m',
  '60d',
  'since 2026-05-04',
  '30bp',
  'beyond 5%',
  'over 10d',
  'on 2m USD',
  'by normal',
  'vol',
  'ratio',
  'mean',
  'above',
  'log',
  'robust',
  'confidence 90%',
  'power 70%',
  'before 2026-06-01',
  'a year',
  'as picture',
  'please',
  'what',
  '95',
  'on window 200d',
  'tail',
  'interval',
  'compare',
);
const said = fc.array(word, { minLength: 1, maxLength: 4 }).map((words) => words.join(' '));

test('what a follow-up is read as is a whole question, which reads back as itself', () => {
  fc.assert(
    fc.property(before, said, (first, text) => {
      const { question } = questionIn(first);
      if (!isStatistical(question)) throw new Error(`${first} asks for no figure`);
      for (const outcome of readMessage(text, context, question).questions) {
        if (!outcome.ok) {
          for (const suggestion of outcome.problem.suggestions)
            expect(readMessage(suggestion, context).questions.every(({ ok }) => ok)).toBe(true);
          continue;
        }
        expect(canonicalText(outcome.value.question)).toBe(outcome.value.canonical);
        expect(questionIn(outcome.value.canonical).canonical).toBe(outcome.value.canonical);
      }
    }),
    settings,
  );
});

test('a follow-up that says all of a question again changes nothing of it, and carries nothing over', () => {
  fc.assert(
    fc.property(before, before, (first, second) => {
      const [{ question }, whole] = [questionIn(first), questionIn(second)];
      if (!isStatistical(question)) throw new Error(`${first} asks for no figure`);
      const [outcome] = readMessage(whole.canonical, context, question).questions;
      expect(outcome).toMatchObject({ ok: true, value: { canonical: whole.canonical } });
      expect(outcome?.ok === true ? outcome.value.assumed.join() : '').not.toContain('carried over');
    }),
    settings,
  );
});

test('whatever is typed after a question is read or refused, never thrown at', () => {
  fc.assert(
    fc.property(before, fc.string({ unit: 'binary', maxLength: 80 }), (first, text) => {
      const { question } = questionIn(first);
      if (!isStatistical(question)) throw new Error(`${first} asks for no figure`);
      for (const outcome of readMessage(text, context, question).questions)
        if (!outcome.ok) expect(outcome.problem.message).not.toMatch(/[<>]|:\/\//);
    }),
    settings,
  );
});
