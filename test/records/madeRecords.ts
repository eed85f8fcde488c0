import { createHash } from 'node:crypto';
import { askedFromNowhere, type RecordedAnswer, type RecordedAsking } from '../../src/terms/records.ts';
import { seriesOf } from '../answers/madeSeries.ts';

/** Closes whose bits a careless store would lose: a subnormal, a negative zero, a third. */
export const delicateCloses = [1 / 3, 5e-324, -0, 1.7976931348623157e308, 100];

export const answerOf = (id: string, more: Partial<RecordedAnswer> = {}): RecordedAnswer => ({
  ids: [id],
  content: createHash('sha256').update(id).digest('hex'),
  verb: 'interval',
  question: 'interval KELP 60d at 95%',
  asOf: '2026-11-27',
  methodVersion: '1',
  body: JSON.stringify({ mean: 0.1 }),
  series: [seriesOf('KELP', delicateCloses)],
  ...more,
});

export const askingAt = (askedAtMs: number, more: Partial<RecordedAsking> = {}): RecordedAsking => ({
  askedAtMs,
  place: 'channel',
  from: { ...askedFromNowhere, team: 'T1', channel: 'C1', person: 'U1', message: '1.5' },
  words: 'interval kelp',
  replyText: 'KELP’s mean …',
  versions: { bot: '0.1.0', node: '20.0.0', settingsHash: 'ab'.repeat(32) },
  ...more,
});
