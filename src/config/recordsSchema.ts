import { z } from 'zod';
import { described } from './internal/described.ts';
import { type Secret, secret } from './secret.ts';

export const defaultRecordsPath = '.leadsman/records.db';

const postgresAddress = /^postgres(ql)?:\/\/\S+$/;

/** The address of a database holds its password, so it is carried as something that does not show itself. */
export const postgresUrl = z
  .string()
  .trim()
  .regex(postgresAddress)
  .transform((url): Secret => secret(url));

export const records = z.strictObject({
  path: described({
    kind: z.string().trim().min(1),
    says: 'file in which answers are kept on record; a relative path starts at the folder of the program',
    expects: 'the path of a file, which is made where there is none',
  }).default(defaultRecordsPath),
  url: described({
    kind: postgresUrl.nullable(),
    says:
      'PostgreSQL database to keep the records in instead of a file, for several copies of the bot; ' +
      'LEADSMAN_RECORDS_URL in the environment says the same without a password standing here',
    expects:
      'an address such as postgresql://leadsman@host:5432/leadsman, or null for the file of records.path',
  }).default(null),
  keepDays: described({
    kind: z.int().min(1).max(36_500).nullable(),
    says: 'how long an asking and its answer are kept; what is older is deleted and leaves a trace of its deletion',
    expects: 'a whole number of days from 1 to 36500, or null for ever',
  }).default(null),
});
