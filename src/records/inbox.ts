import type { InstantMs } from '../terms/clock.ts';
import type { Lease } from '../terms/delivery.ts';
import type { InboxEvent, KeptEvent, PostedContent } from '../terms/inbox.ts';
import type { Result } from '../terms/result.ts';
import type { Access, Database } from './connection.ts';
import type { InboxRow } from './database.ts';
import { isFree, release, renew } from './internal/leases.ts';

/** What people asked, kept before the platform is told that it arrived and until it is dealt with. */
export type InboxStore = {
  /**
   * Keeps an event whose key is new, held by the lease. The event where it is this holder's to deal with; null where it
   * was dealt with, or somebody else does.
   */
  readonly keep: (event: InboxEvent, lease: Lease, nowMs: InstantMs) => Promise<Result<KeptEvent | null>>;
  /** Notes that a message is about to be changed into the answer. */
  readonly willEdit: (key: string, into: PostedContent) => Promise<Result<null>>;
  readonly settle: (key: string, nowMs: InstantMs) => Promise<Result<null>>;
  readonly renew: (keys: readonly string[], lease: Lease) => Promise<Result<null>>;
  /** Takes what nobody holds and is not dealt with, the oldest first, at most so many. */
  readonly takeOver: (
    lease: Lease,
    nowMs: InstantMs,
    underWay: readonly string[],
    most: number,
  ) => Promise<Result<readonly KeptEvent[]>>;
  readonly release: (holder: string) => Promise<Result<null>>;
  /** Every event of a message, before and after edits, the oldest first. */
  readonly ofMessage: (messageKey: string) => Promise<Result<readonly KeptEvent[]>>;
  /** Forgets what was dealt with before an instant. */
  readonly tidy: (beforeMs: InstantMs) => Promise<Result<null>>;
};

const keptOf = (row: InboxRow): KeptEvent => {
  // written by willEdit below
  const editing: PostedContent | null = row.editing === null ? null : JSON.parse(row.editing);
  return {
    key: row.key,
    messageKey: row.message_key,
    kind: row.kind,
    askedAtMs: row.asked_at_ms,
    body: row.body,
    tries: row.tries,
    editing,
    settled: row.settled_at_ms !== null,
  };
};

const keep = (db: Database, event: InboxEvent, lease: Lease, nowMs: InstantMs): Promise<KeptEvent | null> =>
  db.transaction().execute(async (change) => {
    await change
      .insertInto('inbox')
      .values({
        key: event.key,
        holder: null,
        lease_until_ms: 0,
        settled_at_ms: null,
        message_key: event.messageKey,
        kind: event.kind,
        asked_at_ms: event.askedAtMs,
        body: event.body,
        tries: 0,
        editing: null,
      })
      .onConflict((conflict) => conflict.column('key').doNothing())
      .execute();
    const row = await change
      .updateTable('inbox')
      .set(({ eb }) => ({
        holder: lease.holder,
        lease_until_ms: lease.untilMs,
        tries: eb('tries', '+', 1),
      }))
      .where('key', '=', event.key)
      .where('settled_at_ms', 'is', null)
      .where(isFree(lease.holder, nowMs))
      .returningAll()
      .executeTakeFirst();
    return row === undefined ? null : keptOf(row);
  });

/** The condition stands outside the choice too: what another has taken in between is not taken from them. */
const takeOver = async (
  db: Database,
  lease: Lease,
  nowMs: InstantMs,
  underWay: readonly string[],
  most: number,
): Promise<readonly KeptEvent[]> => {
  const free = isFree(lease.holder, nowMs);
  const rows = await db
    .updateTable('inbox')
    .set(({ eb }) => ({ holder: lease.holder, lease_until_ms: lease.untilMs, tries: eb('tries', '+', 1) }))
    .where('key', 'in', (eb) => {
      const waiting = eb.selectFrom('inbox').select('key').where('settled_at_ms', 'is', null).where(free);
      const left = underWay.length === 0 ? waiting : waiting.where('key', 'not in', [...underWay]);
      return left.orderBy('asked_at_ms').limit(most);
    })
    .where('settled_at_ms', 'is', null)
    .where(free)
    .returningAll()
    .execute();
  return rows.map(keptOf);
};

const done = async (work: Promise<unknown>): Promise<null> => {
  await work;
  return null;
};

export const inboxStore = ({ read, write }: Access): InboxStore => ({
  keep: (event, lease, nowMs) => write((db) => keep(db, event, lease, nowMs)),
  willEdit: (key, into) =>
    write((db) =>
      done(
        db
          .updateTable('inbox')
          .set({ editing: JSON.stringify(into) })
          .where('key', '=', key)
          .execute(),
      ),
    ),
  settle: (key, nowMs) =>
    write((db) =>
      done(
        db
          .updateTable('inbox')
          .set({ settled_at_ms: nowMs })
          .where('key', '=', key)
          .where('settled_at_ms', 'is', null)
          .execute(),
      ),
    ),
  renew: (keys, lease) => write((db) => done(renew(db, 'inbox', keys, lease))),
  takeOver: (lease, nowMs, underWay, most) => write((db) => takeOver(db, lease, nowMs, underWay, most)),
  release: (holder) => write((db) => done(release(db, 'inbox', holder))),
  ofMessage: (messageKey) =>
    read(async (db) => {
      const rows = await db
        .selectFrom('inbox')
        .selectAll()
        .where('message_key', '=', messageKey)
        .orderBy('asked_at_ms')
        .execute();
      return rows.map(keptOf);
    }),
  tidy: (beforeMs) =>
    write((db) => done(db.deleteFrom('inbox').where('settled_at_ms', '<', beforeMs).execute())),
});
