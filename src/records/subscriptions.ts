import type { InstantMs } from '../terms/clock.ts';
import type { Result } from '../terms/result.ts';
import type {
  Claim,
  NewSubscription,
  Subscription,
  SubscriptionFilter,
  SubscriptionKind,
} from '../terms/subscriptions.ts';
import type { Access, Database } from './connection.ts';
import { isFree } from './internal/leases.ts';
import { subscriptionOf, subscriptionRow } from './internal/subscriptionRows.ts';

/** Digests and watches, and who does what falls due among them. */
export type SubscriptionStore = {
  readonly add: (given: NewSubscription) => Promise<Result<Subscription>>;
  readonly find: (team: string, id: string) => Promise<Result<Subscription | null>>;
  /** In the order in which they were made. */
  readonly list: (filter: SubscriptionFilter) => Promise<Result<readonly Subscription[]>>;
  /** Keeps a changed one under its next revision; null where it has changed since it was read. */
  readonly save: (changed: Subscription) => Promise<Result<Subscription | null>>;
  /** Those whose next due instant has come, the longest due first, at most so many. */
  readonly dueBefore: (
    team: string,
    nowMs: InstantMs,
    most: number,
  ) => Promise<Result<readonly Subscription[]>>;
  /** Those that were posted on old prices and still wait for the new ones. */
  readonly awaitingPrices: (team: string, nowMs: InstantMs) => Promise<Result<readonly Subscription[]>>;
  /** Follows a channel that has got another id; how many posted there. */
  readonly moveChannel: (team: string, from: string, to: string) => Promise<Result<number>>;
  /** True for one holder at a time; the same holder may claim anew. Never true again once the key is settled. */
  readonly claim: (claim: Claim) => Promise<Result<boolean>>;
  readonly settle: (key: string, nowMs: InstantMs) => Promise<Result<null>>;
  readonly release: (key: string, holder: string) => Promise<Result<null>>;
  /** Forgets what was settled before an instant; how many. */
  readonly forgetSettled: (beforeMs: InstantMs) => Promise<Result<number>>;
};

const letters = { digest: 'D', watch: 'W' } as const;

/** The update waits for whoever counts at the same time, so no number is given twice. */
const nextNumber = async (change: Database, team: string, kind: SubscriptionKind): Promise<number> => {
  await change
    .insertInto('subscription_counters')
    .values({ team, kind, last: 0 })
    .onConflict((conflict) => conflict.columns(['team', 'kind']).doNothing())
    .execute();
  const { last } = await change
    .updateTable('subscription_counters')
    .set(({ eb }) => ({ last: eb('last', '+', 1) }))
    .where('team', '=', team)
    .where('kind', '=', kind)
    .returning('last')
    .executeTakeFirstOrThrow();
  return last;
};

const add = (db: Database, given: NewSubscription): Promise<Subscription> =>
  db.transaction().execute(async (change) => {
    const number = await nextNumber(change, given.team, given.kind);
    const made: Subscription = { ...given, id: `${letters[given.kind]}-${number}`, revision: 1 };
    await change
      .insertInto('subscriptions')
      .values({ ...subscriptionRow(made), number })
      .execute();
    return made;
  });

const listed = async (db: Database, filter: SubscriptionFilter): Promise<readonly Subscription[]> => {
  let query = db.selectFrom('subscriptions').selectAll().where('team', '=', filter.team);
  if (filter.kind !== undefined) query = query.where('kind', '=', filter.kind);
  if (filter.channel !== undefined) query = query.where('channel', '=', filter.channel);
  if (filter.owner !== undefined) query = query.where('owner', '=', filter.owner);
  if (filter.states !== undefined) query = query.where('state', 'in', [...filter.states]);
  const rows = await query.orderBy('kind').orderBy('number').execute();
  return rows.map(subscriptionOf);
};

const save = async (db: Database, changed: Subscription): Promise<Subscription | null> => {
  const next = { ...changed, revision: changed.revision + 1 };
  const { numUpdatedRows } = await db
    .updateTable('subscriptions')
    .set(subscriptionRow(next))
    .where('team', '=', changed.team)
    .where('id', '=', changed.id)
    .where('revision', '=', changed.revision)
    .executeTakeFirst();
  return numUpdatedRows === 1n ? next : null;
};

const claim = async (db: Database, { key, holder, nowMs, leaseMs }: Claim): Promise<boolean> => {
  await db
    .insertInto('subscription_claims')
    .values({ key, holder: null, lease_until_ms: 0, settled_at_ms: null })
    .onConflict((conflict) => conflict.column('key').doNothing())
    .execute();
  const { numUpdatedRows } = await db
    .updateTable('subscription_claims')
    .set({ holder, lease_until_ms: nowMs + leaseMs })
    .where('key', '=', key)
    .where('settled_at_ms', 'is', null)
    .where(isFree(holder, nowMs))
    .executeTakeFirst();
  return numUpdatedRows === 1n;
};

const all = (db: Database, team: string) =>
  db.selectFrom('subscriptions').selectAll().where('team', '=', team);

const done = async (work: Promise<unknown>): Promise<null> => {
  await work;
  return null;
};

export const subscriptionStore = ({ read, write }: Access): SubscriptionStore => ({
  add: (given) => write((db) => add(db, given)),
  find: (team, id) =>
    read(async (db) => {
      const row = await all(db, team).where('id', '=', id).executeTakeFirst();
      return row === undefined ? null : subscriptionOf(row);
    }),
  list: (filter) => read((db) => listed(db, filter)),
  save: (changed) => write((db) => save(db, changed)),
  dueBefore: (team, nowMs, most) =>
    read(async (db) => {
      const due = all(db, team).where('next_due_ms', '<=', nowMs).orderBy('next_due_ms').limit(most);
      return (await due.execute()).map(subscriptionOf);
    }),
  awaitingPrices: (team, nowMs) =>
    read(async (db) => {
      const waiting = all(db, team).where('awaiting_until_ms', '>=', nowMs).orderBy('awaiting_until_ms');
      return (await waiting.execute()).map(subscriptionOf);
    }),
  moveChannel: (team, from, to) =>
    write(async (db) => {
      const { numUpdatedRows } = await db
        .updateTable('subscriptions')
        .set(({ eb }) => ({ channel: to, revision: eb('revision', '+', 1) }))
        .where('team', '=', team)
        .where('channel', '=', from)
        .executeTakeFirst();
      return Number(numUpdatedRows);
    }),
  claim: (asked) => write((db) => claim(db, asked)),
  settle: (key, nowMs) =>
    write((db) =>
      done(
        db
          .updateTable('subscription_claims')
          .set({ settled_at_ms: nowMs })
          .where('key', '=', key)
          .where('settled_at_ms', 'is', null)
          .execute(),
      ),
    ),
  release: (key, holder) =>
    write((db) =>
      done(
        db
          .updateTable('subscription_claims')
          .set({ holder: null, lease_until_ms: 0 })
          .where('key', '=', key)
          .where('holder', '=', holder)
          .where('settled_at_ms', 'is', null)
          .execute(),
      ),
    ),
  forgetSettled: (beforeMs) =>
    write(async (db) => {
      const { numDeletedRows } = await db
        .deleteFrom('subscription_claims')
        .where('settled_at_ms', '<', beforeMs)
        .executeTakeFirst();
      return Number(numDeletedRows);
    }),
});
