import { bench, describe } from 'vitest';
import { readMessage } from '../../src/questions/readMessage.ts';
import { context } from '../questions/asking.ts';

// Reading one line should take less than 50 µs (20,000 a second).
describe('one line', () => {
  for (const text of [
    'interval KELP 60d at 95%',
    'tail KELP at 99% over 10d on 2m USD by student',
    '<@U1> *what’s* the vol of <http://KELP.ONE|KELP.ONE> since 4 May',
  ])
    bench(text, () => void readMessage(text, context));
});

// A refusal also looks for the nearest questions that would work.
describe('one refused line', () => {
  for (const text of ['interval KELQ 60d', 'KELP 60d', 'interval KELP 60d robsut since 04/05/2026'])
    bench(text, () => void readMessage(text, context));
});
