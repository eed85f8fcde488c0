import { digestNowReply } from '../../present/compose/scheduled/digest.ts';
import { doneReply, madeReply, subscriptionsReply } from '../../present/compose/scheduled/subscriptions.ts';
import { watchNowInWords } from '../../present/compose/scheduled/watch.ts';
import type { Reply } from '../../present/reply.ts';
import type { DigestQuestion, SubscriptionQuestion, WatchQuestion } from '../../questions/question.ts';
import { type Result, succeed } from '../../terms/result.ts';
import type { DigestPost } from '../../terms/scheduledPosts.ts';
import type { Subscription } from '../../terms/subscriptions.ts';
import type { Asker } from '../permissions.ts';
import {
  changeDigest,
  findFor,
  inWordsOf,
  makerOf,
  openFor,
  openForChange,
  pause,
  resume,
  type SubscribingDesk,
  stop,
} from './managing.ts';
import type { DeskSubscriptions } from './ports.ts';

/** What is asked of digests and watches, as it was read. */
export type Subscribing = {
  readonly question: SubscriptionQuestion;
  readonly assumed: readonly string[];
  readonly asker: Asker;
};

const kept = async (
  subscriptions: DeskSubscriptions,
  made: Parameters<DeskSubscriptions['store']['add']>[0],
  assumed: readonly string[],
  seesNow: string | null,
): Promise<Result<Reply>> => {
  const added = await subscriptions.store.add(made);
  if (!added.ok) return added;
  const weekdaysAssumed = subscriptions.weekdaysAssumed(added.value);
  return succeed(madeReply(inWordsOf(subscriptions, added.value), { seesNow, assumed, weekdaysAssumed }));
};

const addDigest = (
  subscriptions: DeskSubscriptions,
  question: DigestQuestion & { readonly do: 'add' },
  { assumed, asker }: Subscribing,
): Promise<Result<Reply>> =>
  kept(subscriptions, subscriptions.newDigest(question, makerOf(asker)), assumed, null);

const addWatch = async (
  subscriptions: DeskSubscriptions,
  question: WatchQuestion & { readonly do: 'add' },
  { assumed, asker }: Subscribing,
): Promise<Result<Reply>> => {
  const begun = await subscriptions.newWatch(question, makerOf(asker));
  if (!begun.ok) return begun;
  const { made, watching, reading } = begun.value;
  return kept(subscriptions, made, assumed, watchNowInWords(watching, reading));
};

const listed = async (
  subscriptions: DeskSubscriptions,
  kind: 'digest' | 'watch',
  asker: Asker,
): Promise<Result<Reply>> => {
  const { team, channel, owner } = makerOf(asker);
  const states = ['active', 'paused'] as const;
  const here = await subscriptions.store.list({ team, kind, channel, states });
  if (!here.ok) return here;
  const own = await subscriptions.store.list({ team, kind, owner, states });
  if (!own.ok) return own;
  const elsewhere = own.value.filter((each) => each.channel !== channel);
  const weekdaysAssumed = [...here.value, ...elsewhere].some(subscriptions.weekdaysAssumed);
  const words = (all: readonly Subscription[]) => all.map((each) => inWordsOf(subscriptions, each));
  return succeed(subscriptionsReply(kind, words(here.value), words(elsewhere), weekdaysAssumed));
};

/** What a digest would post now, for whoever may see it. */
export const digestFor = async (
  desk: SubscribingDesk,
  asker: Asker,
  id: string,
): Promise<Result<DigestPost>> => {
  const open = openFor(desk);
  if (!open.ok) return open;
  const found = await findFor(desk, open.value, asker, id, 'see');
  return found.ok ? open.value.digestNow(found.value) : found;
};

const shownNow = async (desk: SubscribingDesk, asker: Asker, id: string): Promise<Result<Reply>> => {
  const post = await digestFor(desk, asker, id);
  return post.ok ? succeed(digestNowReply(post.value)) : post;
};

type Done = 'pause' | 'resume' | 'stop' | 'change';

const done = (desk: SubscribingDesk, changed: Result<Subscription>, what: Done): Result<Reply> => {
  const open = openFor(desk);
  if (!open.ok) return open;
  if (!changed.ok) return changed;
  const weekdaysAssumed = open.value.weekdaysAssumed(changed.value);
  return succeed(doneReply(inWordsOf(open.value, changed.value), what, weekdaysAssumed));
};

const actions = { pause, resume, stop } as const;

/** Pauses, resumes or stops one, and says what has become of it: for words and for buttons. */
export const act = async (
  desk: SubscribingDesk,
  asker: Asker,
  id: string,
  what: keyof typeof actions,
): Promise<Result<Reply>> => done(desk, await actions[what](desk, asker, id), what);

const added = (
  desk: SubscribingDesk,
  question: SubscriptionQuestion & { readonly do: 'add' },
  subscribing: Subscribing,
): Promise<Result<Reply>> => {
  const open = openForChange(desk);
  if (!open.ok) return Promise.resolve(open);
  return question.verb === 'digest'
    ? addDigest(open.value, question, subscribing)
    : addWatch(open.value, question, subscribing);
};

/** Answers what is asked of digests and watches. */
export const answerOfSubscriptions = async (
  desk: SubscribingDesk,
  subscribing: Subscribing,
): Promise<Result<Reply>> => {
  const { question, asker } = subscribing;
  switch (question.do) {
    case 'add':
      return added(desk, question, subscribing);
    case 'list': {
      const open = openFor(desk);
      return open.ok ? listed(open.value, question.verb, asker) : open;
    }
    case 'now':
      return shownNow(desk, asker, question.id);
    case 'change':
      return done(desk, await changeDigest(desk, asker, question.id, question.change), 'change');
    default:
      return act(desk, asker, question.id, question.do);
  }
};
