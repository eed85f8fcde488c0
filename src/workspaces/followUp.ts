import type { StatisticalQuestion } from '../questions/question.ts';
import { type ReadOutcome, readMessage } from '../questions/readMessage.ts';
import type { InstantMs } from '../terms/clock.ts';
import type { PriceSnapshot } from '../terms/prices.ts';
import type { ThreadPlace } from '../terms/records.ts';
import type { Result } from '../terms/result.ts';
import { type Asking, readerOf } from './conversation.ts';
import type { Desk } from './desk.ts';
import { isStatistical } from './questionKinds.ts';
import { fromRecord } from './records/body.ts';

type Before = { readonly question: StatisticalQuestion; readonly askedAtMs: InstantMs };

/** So long after an answer its thread is still about it, for those who do not address the bot. */
export const listeningMs = 30 * 60_000;

/** Of so many newest answers one that the asker may read is taken. */
const mostLookedAt = 5;

/** The thread that something was said in. A direct conversation is one too; what begins a thread stands in none. */
const threadOf = ({ place, from }: Asking): ThreadPlace | null => {
  const channel = from?.channel ?? null;
  if (from === undefined || channel === null || place === 'command') return null;
  if (from.thread === null && place !== 'direct') return null;
  return { team: from.team, channel, thread: from.thread };
};

/** What was answered last in the thread of something that is said; null where there is nothing to carry on from. */
export const questionBefore = async (desk: Desk, asking: Asking): Promise<Before | null> => {
  const thread = threadOf(asking);
  if (thread === null) return null;
  const found = await desk.records.store.conversations.lastIn(thread, mostLookedAt);
  if (!found.ok) return null;
  // a question that was edited does not carry over from what it said before
  const last = found.value.find(
    (each) => each.from.message !== asking.from?.message && desk.permissions.mayRead(readerOf(asking), each),
  );
  if (last === undefined) return null;
  // outside threads a direct conversation goes on for ever, and is not about the same thing for ever
  if (thread.thread === null && desk.clock.nowMs() - last.askedAtMs > listeningMs) return null;
  const body = fromRecord({ ids: [last.id], body: last.body });
  return body.ok ? { question: body.value.question, askedAtMs: last.askedAtMs } : null;
};

/** Reads what somebody asks. Only what is no whole question by itself makes it look for the question before. */
export const readAsked = async (
  desk: Desk,
  asking: Asking,
  live: PriceSnapshot | null,
): Promise<readonly ReadOutcome[]> => {
  const context = desk.contextFor(live);
  if (asking.after !== undefined) return readMessage(asking.text, context, asking.after).questions;
  const alone = readMessage(asking.text, context).questions;
  if (alone.every(({ ok }) => ok)) return alone;
  const before = await questionBefore(desk, asking);
  return before === null ? alone : readMessage(asking.text, context, before.question).questions;
};

/**
 * Whether words in a thread that do not address the bot are a question to it all the same: every word is read, as a
 * question for figures, soon after an answer in that thread.
 */
export const isMeantFor = async (
  desk: Desk,
  asking: Asking,
  live: Result<PriceSnapshot>,
): Promise<boolean> => {
  if (!live.ok) return false;
  const before = await questionBefore(desk, asking);
  if (before === null || desk.clock.nowMs() - before.askedAtMs > listeningMs) return false;
  const { questions } = readMessage(asking.text, desk.contextFor(live.value), before.question);
  return questions.length > 0 && questions.every((each) => each.ok && isStatistical(each.value.question));
};
