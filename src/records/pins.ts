import type { ChannelMove, PinnedCard, PinPlace, PinState } from '../terms/pins.ts';
import type { Result } from '../terms/result.ts';
import type { Access, Database } from './connection.ts';
import type { PinRow } from './database.ts';

/** Cards at the head of discussions, and the ids that channels were given. */
export type PinStore = {
  readonly find: (place: PinPlace, answerId: string) => Promise<Result<PinnedCard | null>>;
  /** The card whose message this is. */
  readonly findCard: (team: string, channel: string, cardTs: string) => Promise<Result<PinnedCard | null>>;
  /** Keeps the card, in the place of the one with the same result in the same thread. */
  readonly put: (card: PinnedCard) => Promise<Result<null>>;
  /** Those that stand in a thread, or in all of a channel, the newest first. */
  readonly standingIn: (
    place: PinPlace | { readonly team: string; readonly channel: string },
  ) => Promise<Result<readonly PinnedCard[]>>;
  /** Those in these states, the oldest first, at most so many. */
  readonly list: (states: readonly PinState[], most: number) => Promise<Result<readonly PinnedCard[]>>;
  /** Notes the new id of a channel and takes its cards along. */
  readonly moveChannel: (move: ChannelMove) => Promise<Result<null>>;
  /** Every new id that was noted, in the order in which they were. */
  readonly moves: () => Promise<Result<readonly ChannelMove[]>>;
};

/** A null is no part of a key, so the top of a channel is written as an empty thread. */
const threadKey = (thread: string | null): string => thread ?? '';

const rowOf = (card: PinnedCard): PinRow => ({
  team: card.team,
  channel: card.channel,
  thread: threadKey(card.thread),
  answer_id: card.answerId,
  question: card.question,
  as_of: card.asOf,
  sentence: card.sentence,
  person: card.person,
  state: card.state,
  card_ts: card.cardTs,
  times: card.times,
  pinned_at_ms: card.pinnedAtMs,
  told_moved: card.toldMoved ? 1 : 0,
  told_restated: card.toldRestated ? 1 : 0,
});

const cardOf = (row: PinRow): PinnedCard => ({
  team: row.team,
  channel: row.channel,
  thread: row.thread === '' ? null : row.thread,
  answerId: row.answer_id,
  question: row.question,
  asOf: row.as_of,
  sentence: row.sentence,
  person: row.person,
  state: row.state,
  cardTs: row.card_ts,
  times: row.times,
  pinnedAtMs: Number(row.pinned_at_ms),
  toldMoved: row.told_moved === 1,
  toldRestated: row.told_restated === 1,
});

const find = async (db: Database, place: PinPlace, answerId: string): Promise<PinnedCard | null> => {
  const row = await db
    .selectFrom('pins')
    .selectAll()
    .where('team', '=', place.team)
    .where('channel', '=', place.channel)
    .where('thread', '=', threadKey(place.thread))
    .where('answer_id', '=', answerId)
    .executeTakeFirst();
  return row === undefined ? null : cardOf(row);
};

const findCard = async (
  db: Database,
  team: string,
  channel: string,
  cardTs: string,
): Promise<PinnedCard | null> => {
  const row = await db
    .selectFrom('pins')
    .selectAll()
    .where('team', '=', team)
    .where('channel', '=', channel)
    .where('card_ts', '=', cardTs)
    .executeTakeFirst();
  return row === undefined ? null : cardOf(row);
};

const put = async (db: Database, card: PinnedCard): Promise<null> => {
  const { team, channel, thread, answer_id, ...rest } = rowOf(card);
  const key = { team, channel, thread, answer_id };
  await db
    .insertInto('pins')
    .values({ ...key, ...rest })
    .onConflict((conflict) => conflict.columns(['team', 'channel', 'thread', 'answer_id']).doUpdateSet(rest))
    .execute();
  return null;
};

const standingIn = async (
  db: Database,
  place: PinPlace | { readonly team: string; readonly channel: string },
): Promise<readonly PinnedCard[]> => {
  const inChannel = db
    .selectFrom('pins')
    .selectAll()
    .where('team', '=', place.team)
    .where('channel', '=', place.channel)
    .where('state', 'in', ['pinned', 'standing'])
    .orderBy('pinned_at_ms', 'desc')
    .orderBy('answer_id');
  const rows = await ('thread' in place
    ? inChannel.where('thread', '=', threadKey(place.thread))
    : inChannel
  ).execute();
  return rows.map(cardOf);
};

const list = async (
  db: Database,
  states: readonly PinState[],
  most: number,
): Promise<readonly PinnedCard[]> => {
  const rows = await db
    .selectFrom('pins')
    .selectAll()
    .where('state', 'in', [...states])
    .orderBy('pinned_at_ms')
    .orderBy('answer_id')
    .limit(most)
    .execute();
  return rows.map(cardOf);
};

const moveChannel = (db: Database, { team, from, to }: ChannelMove): Promise<null> =>
  db.transaction().execute(async (change) => {
    const { last } = await change
      .selectFrom('channel_moves')
      .select(({ fn }) => fn.max('noted_order').as('last'))
      .executeTakeFirstOrThrow();
    const noted_order = Number(last ?? 0) + 1;
    await change
      .insertInto('channel_moves')
      .values({ team, from_id: from, to_id: to, noted_order })
      .onConflict((conflict) => conflict.columns(['team', 'from_id']).doUpdateSet({ to_id: to, noted_order }))
      .execute();
    // ids that were older still lead straight to the newest
    await change
      .updateTable('channel_moves')
      .set({ to_id: to })
      .where('team', '=', team)
      .where('to_id', '=', from)
      .execute();
    await change
      .updateTable('pins')
      .set({ channel: to })
      .where('team', '=', team)
      .where('channel', '=', from)
      .execute();
    return null;
  });

const moves = async (db: Database): Promise<readonly ChannelMove[]> => {
  const rows = await db.selectFrom('channel_moves').selectAll().orderBy('noted_order').execute();
  return rows.map(({ team, from_id: from, to_id: to }) => ({ team, from, to }));
};

export const pinStore = ({ read, write }: Access): PinStore => ({
  find: (place, answerId) => read((db) => find(db, place, answerId)),
  findCard: (team, channel, cardTs) => read((db) => findCard(db, team, channel, cardTs)),
  put: (card) => write((db) => put(db, card)),
  standingIn: (place) => read((db) => standingIn(db, place)),
  list: (states, most) => read((db) => list(db, states, most)),
  moveChannel: (move) => write((db) => moveChannel(db, move)),
  moves: () => read(moves),
});
