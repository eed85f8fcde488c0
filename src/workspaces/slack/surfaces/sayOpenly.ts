import type { Speaking } from '../answer.ts';
import type { SpokenReply } from '../ports.ts';
import type { Respond } from '../respond.ts';

/** Something for everybody in a channel that nobody asked there. */
export type Open = {
  readonly key: string;
  readonly team: string;
  readonly channel: string;
  readonly reply: SpokenReply;
  /** The way where the bot is no member: a message of the platform's, which nobody can pin or change. */
  readonly otherwise: { readonly url: string; readonly reply: SpokenReply } | null;
};

/** The platform's words for a channel that the bot cannot post to, though the person may. */
const notThere = new Set(['not_in_channel', 'channel_not_found']);

const lifeMs = 3_600_000;

export const sayOpenly = async (
  {
    deliveries,
    time,
    log,
    respond,
  }: Pick<Speaking, 'deliveries' | 'time' | 'log'> & { readonly respond: Respond },
  { key, team, channel, reply, otherwise }: Open,
): Promise<void> => {
  const outcome = await deliveries.say({
    key,
    team,
    channel,
    threadTs: null,
    content: { text: reply.text, blocks: reply.blocks },
    urgent: true,
    expiresAtMs: time.nowMs() + lifeMs,
  });
  if (outcome.kind !== 'refused') return;
  if (otherwise !== null && notThere.has(outcome.code))
    await respond(otherwise.url, [otherwise.reply], 'in_channel');
  else log.warn(`An answer for ${channel} was not posted: ${outcome.code}.`);
};
