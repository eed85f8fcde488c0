import { answersReply } from '../../present/answerReply.ts';
import { cardReply } from '../../present/compose/card.ts';
import { type Reply, reply } from '../../present/reply.ts';
import type { PinnedCard, PinPlace } from '../../terms/pins.ts';
import { problem } from '../../terms/problem.ts';
import type { RecordLine } from '../../terms/records.ts';
import { type Result, refuse, succeed } from '../../terms/result.ts';
import { refused, type Spoken, said } from '../conversation.ts';
import type { Desk } from '../desk.ts';
import type { Asker } from '../permissions.ts';
import { fromRecord } from '../records/body.ts';
import { readRecord } from '../records/reading.ts';
import { discussionOf } from './place.ts';
import type { Wall } from './ports.ts';

/** Of so many newest answers of a thread one that the asker may read is taken. */
const mostLookedAt = 5;
const mostAtTerminal = 50;

const privately = (sentence: string): Spoken => said(reply('refusal', sentence));

const nothingHere = refuse(
  problem(
    'missingPart',
    'There is no result in this thread to pin. Write pin and the id that stands below an answer, such as pin R-7Q2M9K4TXD.',
  ),
);

/** What was asked last at the terminal, in the channel and thread in which one stands. */
const lastAtTerminal = async (desk: Desk, { from }: Asker): Promise<Result<readonly RecordLine[]>> => {
  const lines = await desk.records.store.list({ ticker: null, sinceMs: null }, mostAtTerminal);
  if (!lines.ok) return lines;
  const inThread = ({ thread, message }: RecordLine['from']): boolean =>
    thread === from.thread || (from.thread !== null && message === from.thread);
  return succeed(
    lines.value.filter(
      (line) => line.from.team === null && line.from.channel === from.channel && inThread(line.from),
    ),
  );
};

/** The last result of the discussion. */
const lastResult = async (desk: Desk, asker: Asker, place: PinPlace): Promise<Result<string>> => {
  const thread = { team: asker.from.team, channel: place.channel, thread: place.thread };
  const found =
    asker.from.team === null
      ? await lastAtTerminal(desk, asker)
      : await desk.records.store.conversations.lastIn(thread, mostLookedAt);
  if (!found.ok) return found;
  const last = found.value.find((each) => desk.permissions.mayRead(asker, each));
  return last === undefined ? nothingHere : succeed(last.id);
};

type Wanted = Pick<PinnedCard, 'answerId' | 'question' | 'asOf' | 'sentence'>;

const wantedOf = async (desk: Desk, asker: Asker, id: string): Promise<Result<Wanted>> => {
  const reading = { store: desk.records.store, permissions: desk.permissions };
  const record = await readRecord(reading, asker, id);
  if (!record.ok) return record;
  const body = fromRecord(record.value.answer);
  if (!body.ok) return body;
  const { ids, question, asOf } = record.value.answer;
  return succeed({ answerId: ids[0], question, asOf, sentence: answersReply(body.value.answers).sentence });
};

/** What is said once under it: the same card after it was taken off is another one. */
const cardKey = ({ team, channel, thread, answerId, times }: PinnedCard): string =>
  `card:${team}:${channel}:${thread ?? ''}:${answerId}:${times}`;

const whyNotPinned = (code: string): string => {
  if (code === 'too_many_pins' || code === 'pin_limit_reached')
    return 'the channel has as many pins as it can hold';
  if (code === 'permission_denied' || code === 'restricted_action' || code === 'missing_scope')
    return 'it does not let me pin here';
  return code === 'not_pinnable' ? 'it does not let this message be pinned' : `it says ${code}`;
};

/** Posts a card and pins it, each once however often it is tried. */
export const putUp = async (
  { store }: Pick<Desk['pins'], 'store'>,
  wall: Wall,
  card: PinnedCard,
): Promise<readonly Spoken[]> => {
  const posted = await wall.say(cardKey(card), card, cardReply(card));
  if (posted.kind !== 'said') {
    await store.put({ ...card, state: 'removed' });
    const why = posted.kind === 'refused' ? ` (${posted.code})` : '';
    return [privately(`The platform does not let me post a card here${why}, so nothing is pinned.`)];
  }
  const pinned = await wall.pin(card.channel, posted.ts);
  const state = pinned.kind === 'done' ? 'pinned' : 'standing';
  const kept = await store.put({ ...card, state, cardTs: posted.ts });
  if (pinned.kind === 'done') return kept.ok ? [] : [refused(kept)];
  const why = pinned.kind === 'refused' ? whyNotPinned(pinned.code) : 'it does not answer';
  return [privately(`The card stands in the thread, but the platform has not pinned it: ${why}.`)];
};

/** In a terminal the card is the reply, and the list of cards the wall. */
const shown = async (desk: Desk, card: PinnedCard): Promise<readonly Spoken[]> => {
  const kept = await desk.pins.store.put({ ...card, state: 'pinned' });
  return [kept.ok ? said(cardReply(card)) : refused(kept)];
};

const notThere: Reply = reply(
  'refusal',
  'Nothing can be pinned yet: the bot has only just started. Try again in a moment.',
);

/** Keeps a result at the head of a discussion: the one that an id names, else the last one there. */
export const pinResult = async (desk: Desk, asker: Asker, id: string | null): Promise<readonly Spoken[]> => {
  if (asker.place === 'command')
    return [privately('A private reply cannot be pinned. Mention me in the thread and write pin there.')];
  const place = discussionOf(asker);
  const named = id === null ? await lastResult(desk, asker, place) : succeed(id);
  if (!named.ok) return [refused(named)];
  const wanted = await wantedOf(desk, asker, named.value);
  if (!wanted.ok) return [refused(wanted)];
  const { store } = desk.pins;
  const before = await store.find(place, wanted.value.answerId);
  if (!before.ok) return [refused(before)];
  if (before.value?.state === 'pinned')
    return [privately(`${wanted.value.answerId} is pinned here already.`)];
  const card: PinnedCard = {
    ...place,
    ...wanted.value,
    person: asker.from.person,
    state: 'posting',
    cardTs: null,
    times: (before.value?.times ?? 0) + (before.value === null || before.value.state === 'removed' ? 1 : 0),
    pinnedAtMs: desk.clock.nowMs(),
    toldMoved: false,
    toldRestated: false,
  };
  const wall = desk.pins.wall();
  if (asker.from.team === null) return shown(desk, card);
  if (wall === null) return [said(notThere)];
  const kept = await store.put(card);
  return kept.ok ? putUp(desk.pins, wall, card) : [refused(kept)];
};

/** Takes a card off again; the message stays where it stands. */
export const unpinResult = async (
  desk: Desk,
  asker: Asker,
  id: string | null,
): Promise<readonly Spoken[]> => {
  const place = discussionOf(asker);
  const { store } = desk.pins;
  const standing = await store.standingIn(place);
  if (!standing.ok) return [refused(standing)];
  const card = standing.value.find(({ answerId }) => id === null || answerId === id);
  if (card === undefined)
    return [
      privately(id === null ? 'Nothing is pinned in this thread.' : `${id} is not pinned in this thread.`),
    ];
  const wall = desk.pins.wall();
  if (card.cardTs !== null && card.state === 'pinned') {
    if (wall === null) return [said(notThere)];
    const outcome = await wall.unpin(card.channel, card.cardTs);
    if (outcome.kind !== 'done') {
      const why = outcome.kind === 'refused' ? ` (${outcome.code})` : '';
      return [
        privately(`The platform has not taken the pin of ${card.answerId} off${why}. Try again later.`),
      ];
    }
  }
  const kept = await store.put({ ...card, state: 'removed' });
  return [kept.ok ? said(reply('record', `${card.answerId} is no longer pinned here.`)) : refused(kept)];
};
