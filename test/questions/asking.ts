import { expect } from 'vitest';
import type { ReadQuestion } from '../../src/questions/question.ts';
import { type ReadContext, type ReadingProblem, readMessage } from '../../src/questions/readMessage.ts';
import { createVocabulary } from '../../src/questions/vocabulary.ts';
import { dayFromIso } from '../../src/terms/day.ts';
import type { Level } from '../../src/terms/level.ts';
import type { Window } from '../../src/terms/window.ts';

export const dayOf = (iso: string): number => {
  const day = dayFromIso(iso);
  if (day === null) throw new RangeError(`dayOf: ${iso} is no day`);
  return day;
};

export const percent = (digits: number): Level => ({ digits, places: 2 });

const returns = (count: number): Window => ({ kind: 'returns', count });

const everyVerb = [
  'interval',
  'tail',
  'shape',
  'claim',
  'need',
  'compare',
  'backtest',
  'digest',
  'watch',
  'pin',
  'unpin',
  'again',
  'records',
  'feed',
  'help',
];

/** A feed whose tickers include one with a dot, one with a slash, and some that are words of the language. */
export const tickers = [
  'KELP',
  'TARN',
  'WREN',
  'KELP.ONE',
  'EUR/USD',
  'ALL',
  'ES',
  'M',
  'BRK-B',
  '700',
  'FOR',
  'MAY',
];

/** A desk on Friday 27 November 2026. */
export const context: ReadContext = {
  vocabulary: createVocabulary(
    tickers,
    new Map([
      ['London', 'Europe/London'],
      ['New York', 'America/New_York'],
    ]),
  ),
  today: dayOf('2026-11-27'),
  builtVerbs: everyVerb,
  defaults: {
    interval: { window: returns(60), level: percent(95) },
    claim: { window: returns(60), level: percent(95) },
    need: { window: returns(60), level: percent(95), power: { digits: 8, places: 1 } },
    compare: { window: returns(60), level: percent(95) },
    tail: { window: returns(500), level: percent(99), confidence: percent(95), horizonDays: 1 },
    shape: { window: returns(500), confidence: percent(95) },
    backtest: { window: returns(500), level: percent(99), estimationReturns: 250 },
    digest: {
      window: returns(500),
      level: percent(99),
      model: 'student',
      minutes: 510,
      timeZone: 'Europe/London',
    },
  },
};

/** Every question of a message that must be read whole. */
export const questionsIn = (text: string, given: ReadContext = context): readonly ReadQuestion[] =>
  readMessage(text, given).questions.map((outcome) => {
    if (!outcome.ok) throw new Error(`${text}: ${outcome.problem.message}`);
    return outcome.value;
  });

/** The only question of a message. */
export const questionIn = (text: string, given: ReadContext = context): ReadQuestion => {
  const [question, another] = questionsIn(text, given);
  expect(another).toBe(undefined);
  if (question === undefined) throw new Error(`${text}: nothing was asked`);
  return question;
};

export const canonicalsOf = (text: string, given: ReadContext = context): readonly string[] =>
  questionsIn(text, given).map(({ canonical }) => canonical);

/** The only problem of a message that must be refused. */
export const problemIn = (text: string, given: ReadContext = context): ReadingProblem => {
  const [outcome, another] = readMessage(text, given).questions;
  expect(another).toBe(undefined);
  if (outcome?.ok !== false) throw new Error(`${text}: was not refused`);
  return outcome.problem;
};
