import { z } from 'zod';
import { described } from './internal/described.ts';
import { ianaZone, levelOfAtLeastHalf, timeOfDay } from './kinds.ts';

const models = ['historical', 'normal', 'student', 'filtered', 'peaks'] as const;

/** What is posted by itself, and when. */
export const digests = z.strictObject({
  model: described({
    kind: z.enum(models),
    says: 'model of the tail figures in digests and watches that name none',
    expects: `one of ${models.join(', ')}`,
  }).default('student'),
  level: described({
    kind: levelOfAtLeastHalf,
    says: 'level of the tail figures in digests and watches that name none',
    expects: 'a percentage such as 99%, 50% at the least',
  }).prefault('99%'),
  time: described({
    kind: timeOfDay,
    says: 'when a digest that names no time is posted, on the clocks of deskTimeZone',
    expects: 'a time such as 08:30',
  }).prefault('08:30'),
  waitForPricesMinutes: described({
    kind: z.int().min(0).max(720),
    says: 'how long a digest waits for the closes of the last session before it is posted on older ones',
    expects: 'a whole number of minutes from 0 to 720',
  }).default(30),
  mostLateHours: described({
    kind: z.int().min(1).max(23),
    says: 'a digest that is later than this, because the bot was not running, is left out and the next one says so',
    expects: 'a whole number of hours from 1 to 23',
  }).default(3),
  picture: described({
    kind: z.boolean(),
    says: 'a digest is followed by its picture, in its thread',
    expects: 'true or false',
  }).default(false),
  cities: z.record(z.string().trim().min(1), ianaZone).default({}).meta({
    description: 'cities that schedules may name in the place of a time zone',
    expects: 'names, each with an IANA time zone such as Europe/London',
  }),
});
