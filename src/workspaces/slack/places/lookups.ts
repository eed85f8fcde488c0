import { z } from 'zod';
import type { ChannelFacts, PersonFacts } from '../../access/places.ts';
import type { Outcome, Wire } from '../wire.ts';
import type { Lookups } from './known.ts';

const channelShape = z.object({
  channel: z.object({
    is_private: z.boolean().optional(),
    is_im: z.boolean().optional(),
    is_mpim: z.boolean().optional(),
    is_archived: z.boolean().optional(),
    is_member: z.boolean().optional(),
    is_ext_shared: z.boolean().optional(),
    is_pending_ext_shared: z.boolean().optional(),
  }),
});

export const personShape = z.object({
  id: z.string(),
  team_id: z.string().optional(),
  deleted: z.boolean().optional(),
  is_restricted: z.boolean().optional(),
  is_ultra_restricted: z.boolean().optional(),
  is_stranger: z.boolean().optional(),
  /** People of a large organisation are at home in another workspace of it, and are no strangers. */
  enterprise_user: z.unknown().optional(),
});

export const personFacts = (user: z.infer<typeof personShape>, team: string): PersonFacts => {
  const elsewhere = user.team_id !== undefined && user.team_id !== team && user.enterprise_user === undefined;
  const limited = user.is_restricted === true || user.is_ultra_restricted === true;
  return { left: user.deleted === true, guest: limited || user.is_stranger === true || elsewhere };
};

const gone: Omit<ChannelFacts, 'guests'> = {
  kind: 'private',
  there: false,
  archived: false,
  joined: false,
  shared: false,
};

const refusedWith = (outcome: Outcome, ...codes: readonly string[]): boolean =>
  outcome.kind === 'refused' && codes.includes(outcome.code);

const pageShape = z.object({
  members: z.array(z.unknown()),
  response_metadata: z.object({ next_cursor: z.string().optional() }).optional(),
});

const aPage = 1_000;
const mostPages = 50;

/** A list that comes in pages, whole or not at all. */
const wholeList = async <T>(
  wire: Wire,
  method: string,
  args: Readonly<Record<string, unknown>>,
  item: z.ZodType<T>,
): Promise<readonly T[] | null> => {
  const found: T[] = [];
  let cursor = '';
  for (let pages = 0; pages < mostPages; pages += 1) {
    const from = cursor === '' ? {} : { cursor };
    const outcome = await wire.call(method, { ...args, limit: aPage, ...from });
    const read = outcome.kind === 'done' ? pageShape.safeParse(outcome.body) : null;
    const items = z.array(item).safeParse(read?.data?.members);
    if (read?.success !== true || !items.success) return null;
    found.push(...items.data);
    cursor = read.data.response_metadata?.next_cursor ?? '';
    if (cursor === '') return found;
  }
  return null;
};

export const lookupsOver = (wire: Wire): Lookups => ({
  channel: async (channel) => {
    const outcome = await wire.call('conversations.info', { channel });
    if (refusedWith(outcome, 'channel_not_found')) return gone;
    const read = outcome.kind === 'done' ? channelShape.safeParse(outcome.body) : null;
    if (read?.success !== true) return null;
    const { is_private, is_im, is_mpim, is_archived, is_member, is_ext_shared, is_pending_ext_shared } =
      read.data.channel;
    const direct = is_im === true;
    return {
      kind: direct ? 'direct' : is_private === true || is_mpim === true ? 'private' : 'public',
      there: true,
      archived: is_archived === true,
      joined: direct || is_member === true,
      shared: is_ext_shared === true || is_pending_ext_shared === true,
    };
  },

  members: (channel) => wholeList(wire, 'conversations.members', { channel }, z.string()),

  everybody: async (team) => {
    const users = await wholeList(wire, 'users.list', {}, personShape);
    return users === null ? null : new Map(users.map((user) => [user.id, personFacts(user, team)]));
  },

  person: async (team, person) => {
    const outcome = await wire.call('users.info', { user: person });
    // whom the workspace does not know is not of it
    if (refusedWith(outcome, 'user_not_found', 'user_not_visible')) return { left: false, guest: true };
    const read = outcome.kind === 'done' ? z.object({ user: personShape }).safeParse(outcome.body) : null;
    return read?.success === true ? personFacts(read.data.user, team) : null;
  },
});
