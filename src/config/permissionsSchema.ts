import { z } from 'zod';
import { described } from './internal/described.ts';

/** Stands among channels for the direct messages with the bot. */
export const directMessages = 'direct';

/** The verbs that can be confined to channels: all of the question language. */
export const confinableVerbs = [
  'interval',
  'tail',
  'shape',
  'claim',
  'need',
  'compare',
  'backtest',
  'book',
  'digest',
  'watch',
  'pin',
  'unpin',
  'again',
  'records',
  'feed',
  'help',
] as const;

/** The platform's own ids: a name can be given to another channel or person, an id cannot. */
const team = z.string().regex(/^[TE][A-Z0-9]{2,30}$/);
const channelId = z.string().regex(/^[CG][A-Z0-9]{2,30}$/);
const place = z.union([channelId, z.literal(directMessages)]);
const person = z.string().regex(/^[UW][A-Z0-9]{2,30}$/);

/** Who may do what. A list that names anything denies what it does not name; an empty one denies nothing. */
export const permissions = z.strictObject({
  workspaces: described({
    kind: z.array(team),
    says: 'workspaces in which the bot answers; empty: in every one that it is installed in',
    expects: 'a list of workspace ids such as [T024DESK]',
  }).default([]),
  channels: described({
    kind: z.array(place),
    says: 'channels in which the bot answers, and direct for direct messages; empty: wherever it is asked',
    expects: 'a list of channel ids such as [C024RISK, direct]',
  }).default([]),
  people: described({
    kind: z.array(person),
    says: 'people whom the bot answers; empty: everybody who is not a guest',
    expects: 'a list of person ids such as [U024ADA]',
  }).default([]),
  verbs: z.record(z.string(), z.array(place)).default({}).meta({
    description:
      'verbs that can be asked in the named channels only; elsewhere they are refused in private. Other verbs are not confined',
    expects: 'verbs, each with a list of channel ids such as book: [C024RISK, direct]',
  }),
  sharedChannels: described({
    kind: z.array(channelId),
    says: 'channels in which the bot answers although they are shared with another company, or will be, or have guests: all of them can read everything said there',
    expects: 'a list of channel ids such as [C024FUND]',
  }).default([]),
  digestManagers: described({
    kind: z.array(person),
    says: 'people who may stop and change the digests and watches of others; empty, with nothing else named under permissions: everybody',
    expects: 'a list of person ids such as [U024ADA]',
  }).default([]),
  questionsPerMinute: described({
    kind: z.int().min(1).max(600).nullable(),
    says: 'how many questions and presses of one person are answered within a minute',
    expects: 'a whole number from 1 to 600, or null for no limit',
  }).default(30),
});
