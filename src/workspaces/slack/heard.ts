import { z } from 'zod';
import type { Self } from './lookup.ts';

const spoken = z.object({
  type: z.enum(['app_mention', 'message']),
  channel: z.string(),
  ts: z.string(),
  user: z.string().optional(),
  text: z.string().optional(),
  thread_ts: z.string().optional(),
  subtype: z.string().optional(),
  bot_id: z.string().optional(),
  edited: z.object({ ts: z.string() }).optional(),
});

/** A question put to the bot in a channel or directly. */
export type Heard = {
  /** The same however often and in whatever kinds of event the question arrives; another after an edit. */
  readonly eventKey: string;
  /** The same before and after an edit. */
  readonly messageKey: string;
  readonly team: string;
  readonly channel: string;
  readonly ts: string;
  readonly threadTs: string | null;
  readonly user: string;
  readonly direct: boolean;
  /** What was said to the bot, without the mention. */
  readonly words: string;
  readonly editedTs: string | null;
};

/** People's words come without a subtype, or with one of these; every other subtype is the platform's own news. */
const subtypesOfPeople = new Set(['file_share', 'thread_broadcast']);

const mentionOf = (self: Self): RegExp => new RegExp(`<@${self.userId}(\\|[^>]*)?>`, 'g');

const withoutMention = (text: string, self: Self): string =>
  text
    .replaceAll(mentionOf(self), ' ')
    .replace(/^[\s:,]+/, '')
    .trim();

type Said = Heard & { readonly addressed: boolean };

/** What a person said in an event; null where nobody of the people did. */
const saidIn = (event: unknown, team: string, self: Self): Said | null => {
  const read = spoken.safeParse(event);
  if (!read.success) return null;
  const { type, channel, ts, user, text = '', thread_ts, subtype, bot_id, edited } = read.data;
  if (bot_id !== undefined || user === undefined || user === self.userId) return null;
  if (subtype !== undefined && !subtypesOfPeople.has(subtype)) return null;
  const direct = channel.startsWith('D');
  const editedTs = edited?.ts ?? null;
  return {
    eventKey: JSON.stringify([team, channel, ts, editedTs]),
    messageKey: JSON.stringify([team, channel, ts]),
    team,
    channel,
    ts,
    threadTs: thread_ts ?? null,
    user,
    direct,
    words: withoutMention(text, self),
    editedTs,
    addressed: direct || type === 'app_mention' || mentionOf(self).test(text),
  };
};

/** The question in an event, or null where the event holds none for the bot. */
export const heardIn = (event: unknown, team: string, self: Self): Heard | null => {
  const said = saidIn(event, team, self);
  if (said === null || !said.addressed) return null;
  const { addressed: _, ...heard } = said;
  return heard;
};

/** Words in a thread that do not address the bot: the only ones of that kind that it may ever look at. */
export const overheardIn = (event: unknown, team: string, self: Self): Heard | null => {
  const said = saidIn(event, team, self);
  if (said === null || said.addressed || said.threadTs === null || said.editedTs !== null) return null;
  const { addressed: _, ...heard } = said;
  return heard;
};

const bodyOfEvent = z.object({ team_id: z.string().catch(''), event: z.looseObject({ type: z.string() }) });

/** Whether anything in it is meant for the bot. People's words that are not are never kept anywhere. */
export const concernsBot = (body: unknown, self: Self): boolean => {
  const read = bodyOfEvent.safeParse(body);
  if (!read.success || !spoken.shape.type.safeParse(read.data.event.type).success) return true;
  return heardIn(read.data.event, read.data.team_id, self) !== null;
};
