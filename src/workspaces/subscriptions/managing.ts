import type { SubscriptionInWords } from '../../present/compose/scheduled/subscriptions.ts';
import type { DigestChange } from '../../questions/question.ts';
import { problem } from '../../terms/problem.ts';
import { type Refusal, type Result, refuse, succeed } from '../../terms/result.ts';
import type { Subscription } from '../../terms/subscriptions.ts';
import type { Desk } from '../desk.ts';
import type { Asker } from '../permissions.ts';
import type { DeskSubscriptions, Maker } from './ports.ts';

export type SubscribingDesk = Pick<Desk, 'permissions'> & {
  readonly subscriptions: DeskSubscriptions | null;
};

/** A terminal is a workspace of one person; it names what a platform would give ids to. */
export const terminalTeam = 'terminal';
const ofTerminal = { channel: '#desk', person: 'you' } as const;

/** Who asks, as the owner of what they make, and the place where it will speak. */
export const makerOf = ({ place, from }: Asker): Maker => {
  if (from.team === null)
    return {
      team: terminalTeam,
      owner: from.person ?? ofTerminal.person,
      place: 'terminal',
      channel: from.channel ?? ofTerminal.channel,
    };
  const direct = place === 'direct' || from.channel === null || from.channel.startsWith('D');
  return {
    team: from.team,
    owner: from.person ?? '',
    place: direct ? 'direct' : 'channel',
    channel: from.channel ?? from.person ?? '',
  };
};

/** Said of an id that does not exist and of one that the asker may not see, so that neither tells of the other. */
const noSuch = (id: string): Refusal => {
  const kind = id.startsWith('W') ? 'watch' : 'digest';
  return refuse(
    problem(
      'unknownSubscription',
      `There is no ${kind} ${id} that can be shown here. ${kind} list shows what there is.`,
      { suggestion: `${kind} list` },
    ),
  );
};

const notHere = (): Refusal =>
  refuse(
    problem('storeUnavailable', 'Digests and watches are not kept here. Ask for them where the bot runs.'),
  );

const onlyRead = (): Refusal =>
  refuse(
    problem(
      'storeUnavailable',
      'Digests and watches are only read by this command. Make and change them where the bot runs.',
    ),
  );

export const openFor = (desk: SubscribingDesk): Result<DeskSubscriptions> =>
  desk.subscriptions === null ? notHere() : succeed(desk.subscriptions);

export const openForChange = (desk: SubscribingDesk): Result<DeskSubscriptions> => {
  const open = openFor(desk);
  return open.ok && !open.value.keeps ? onlyRead() : open;
};

/** What may be done with one: everybody in its place may see, pause and resume it, its owner and managers anything. */
type Right = 'see' | 'manage';

/** A digest or a watch that the asker has a right to. */
export const findFor = async (
  desk: SubscribingDesk,
  { store }: DeskSubscriptions,
  asker: Asker,
  id: string,
  right: Right,
): Promise<Result<Subscription>> => {
  const maker = makerOf(asker);
  const found = await store.find(maker.team, id);
  if (!found.ok) return found;
  const subscription = found.value;
  if (subscription === null) return noSuch(id);
  const manages = desk.permissions.mayManage(asker, subscription);
  if (manages) return succeed(subscription);
  if (subscription.channel !== maker.channel) return noSuch(id);
  if (right === 'see') return succeed(subscription);
  return refuse(
    problem(
      'notPermitted',
      `${id} belongs to who made it, and they or a manager of digests may do that. You may pause it.`,
      { suggestion: `${subscription.kind} pause ${id}` },
    ),
  );
};

export const inWordsOf = (subscriptions: DeskSubscriptions, given: Subscription): SubscriptionInWords => ({
  id: given.id,
  kind: given.kind,
  state: given.state,
  pausedWhy: given.pausedWhy,
  asks: subscriptions.asks(given),
  nextDueMs: given.nextDueMs,
  timeZone: given.schedule?.timeZone ?? null,
});

const mostAttempts = 5;

const alreadyStopped = (id: string): Refusal =>
  refuse(
    problem('unknownSubscription', `${id} is stopped. Make a new one; its id is not used again.`, {
      suggestion: `${id.startsWith('W') ? 'watch' : 'digest'} list`,
    }),
  );

/** Changes one as it stands: what others changed meanwhile is kept. */
const changing = async (
  desk: SubscribingDesk,
  asker: Asker,
  id: string,
  right: Right,
  change: (subscriptions: DeskSubscriptions, current: Subscription) => Result<Subscription>,
): Promise<Result<Subscription>> => {
  const open = openForChange(desk);
  if (!open.ok) return open;
  for (let attempt = 0; attempt < mostAttempts; attempt += 1) {
    const current = await findFor(desk, open.value, asker, id, right);
    if (!current.ok) return current;
    if (current.value.state === 'stopped') return alreadyStopped(id);
    const changed = change(open.value, current.value);
    if (!changed.ok) return changed;
    const saved = await open.value.store.save(changed.value);
    if (!saved.ok) return saved;
    if (saved.value !== null) return succeed(saved.value);
  }
  return refuse(problem('storeUnavailable', `${id} is being changed by others. Try again in a moment.`));
};

export const pause = (desk: SubscribingDesk, asker: Asker, id: string): Promise<Result<Subscription>> =>
  changing(desk, asker, id, 'see', (subscriptions, current) => succeed(subscriptions.paused(current)));

export const resume = (desk: SubscribingDesk, asker: Asker, id: string): Promise<Result<Subscription>> =>
  changing(desk, asker, id, 'see', (subscriptions, current) => subscriptions.resumed(current));

export const stop = (desk: SubscribingDesk, asker: Asker, id: string): Promise<Result<Subscription>> =>
  changing(desk, asker, id, 'manage', (subscriptions, current) => succeed(subscriptions.stopped(current)));

export const changeDigest = (
  desk: SubscribingDesk,
  asker: Asker,
  id: string,
  change: DigestChange,
): Promise<Result<Subscription>> =>
  changing(desk, asker, id, 'manage', (subscriptions, current) => subscriptions.changed(current, change));

/** What somebody has made and not stopped, wherever it speaks. */
export const listFor = async (
  desk: SubscribingDesk,
  team: string,
  person: string,
): Promise<Result<readonly SubscriptionInWords[]>> => {
  const open = openFor(desk);
  if (!open.ok) return open;
  const found = await open.value.store.list({ team, owner: person, states: ['active', 'paused'] });
  return found.ok ? succeed(found.value.map((each) => inWordsOf(open.value, each))) : found;
};
