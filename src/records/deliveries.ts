import type { InstantMs } from '../terms/clock.ts';
import type { KeptSaying, Lease, MessageContent, Saying, SayingOutcome } from '../terms/delivery.ts';
import type { Result } from '../terms/result.ts';
import type { Access, Database } from './connection.ts';
import type { DeliveryRow } from './database.ts';
import { isFree, release, renew } from './internal/leases.ts';

/** What is to be said, kept before the first attempt and until it is settled. */
export type DeliveryStore = {
  /** Keeps a saying whose key is new. What is kept under the key, held by the lease unless another holder has it. */
  readonly take: (
    saying: Saying,
    deliveryId: string,
    lease: Lease,
    nowMs: InstantMs,
  ) => Promise<Result<KeptSaying>>;
  /** Notes that an attempt begins; false where it is settled or somebody else's by now. */
  readonly begin: (key: string, lease: Lease, nowMs: InstantMs) => Promise<Result<boolean>>;
  /** Notes that the last attempt is known to have done nothing. */
  readonly undone: (key: string, holder: string) => Promise<Result<null>>;
  readonly settle: (key: string, outcome: SayingOutcome, nowMs: InstantMs) => Promise<Result<null>>;
  readonly renew: (keys: readonly string[], lease: Lease) => Promise<Result<null>>;
  /** Takes what nobody holds and is not settled, what a person waits for first, at most so many. */
  readonly takeOver: (
    lease: Lease,
    nowMs: InstantMs,
    underWay: readonly string[],
    most: number,
  ) => Promise<Result<readonly KeptSaying[]>>;
  readonly release: (holder: string) => Promise<Result<null>>;
  /** What is kept under these keys, in no order. */
  readonly find: (keys: readonly string[]) => Promise<Result<readonly KeptSaying[]>>;
  /** Empties the content of what was settled before one instant, and forgets what was settled before another. */
  readonly tidy: (emptyBeforeMs: InstantMs, forgetBeforeMs: InstantMs) => Promise<Result<null>>;
};

const emptied: MessageContent = { text: '', blocks: [] };

const keptOf = (row: DeliveryRow): KeptSaying => {
  // both written below
  const content: MessageContent = row.content === '' ? emptied : JSON.parse(row.content);
  const outcome: SayingOutcome | null = row.outcome === null ? null : JSON.parse(row.outcome);
  return {
    key: row.key,
    team: row.team,
    channel: row.channel,
    threadTs: row.thread,
    content,
    urgent: row.urgent === 1,
    expiresAtMs: row.expires_at_ms,
    deliveryId: row.delivery_id,
    createdAtMs: row.created_at_ms,
    firstAttemptMs: row.first_attempt_ms,
    lastAttemptMs: row.last_attempt_ms,
    unsure: row.unsure === 1,
    lease: row.holder === null ? null : { holder: row.holder, untilMs: row.lease_until_ms },
    outcome,
  };
};

const newRow = (saying: Saying, deliveryId: string, lease: Lease, nowMs: InstantMs): DeliveryRow => ({
  key: saying.key,
  holder: lease.holder,
  lease_until_ms: lease.untilMs,
  settled_at_ms: null,
  delivery_id: deliveryId,
  team: saying.team,
  channel: saying.channel,
  thread: saying.threadTs,
  content: JSON.stringify(saying.content),
  urgent: saying.urgent ? 1 : 0,
  expires_at_ms: saying.expiresAtMs,
  created_at_ms: nowMs,
  first_attempt_ms: null,
  last_attempt_ms: null,
  unsure: 0,
  outcome: null,
});

const take = (db: Database, row: DeliveryRow, nowMs: InstantMs): Promise<KeptSaying> =>
  db.transaction().execute(async (change) => {
    await change
      .insertInto('deliveries')
      .values(row)
      .onConflict((conflict) => conflict.column('key').doNothing())
      .execute();
    await change
      .updateTable('deliveries')
      .set({ holder: row.holder, lease_until_ms: row.lease_until_ms })
      .where('key', '=', row.key)
      .where('settled_at_ms', 'is', null)
      .where(isFree(row.holder ?? '', nowMs))
      .execute();
    return keptOf(
      await change.selectFrom('deliveries').selectAll().where('key', '=', row.key).executeTakeFirstOrThrow(),
    );
  });

const begin = async (db: Database, key: string, lease: Lease, nowMs: InstantMs): Promise<boolean> => {
  const { numUpdatedRows } = await db
    .updateTable('deliveries')
    .set(({ fn, val }) => ({
      unsure: 1,
      lease_until_ms: lease.untilMs,
      last_attempt_ms: nowMs,
      first_attempt_ms: fn.coalesce('first_attempt_ms', val(nowMs)),
    }))
    .where('key', '=', key)
    .where('holder', '=', lease.holder)
    .where('settled_at_ms', 'is', null)
    .executeTakeFirst();
  return numUpdatedRows === 1n;
};

/** The condition stands outside the choice too: what another has taken in between is not taken from them. */
const takeOver = async (
  db: Database,
  lease: Lease,
  nowMs: InstantMs,
  underWay: readonly string[],
  most: number,
): Promise<readonly KeptSaying[]> => {
  const free = isFree(lease.holder, nowMs);
  const rows = await db
    .updateTable('deliveries')
    .set({ holder: lease.holder, lease_until_ms: lease.untilMs })
    .where('key', 'in', (eb) => {
      const waiting = eb
        .selectFrom('deliveries')
        .select('key')
        .where('settled_at_ms', 'is', null)
        .where(free);
      const left = underWay.length === 0 ? waiting : waiting.where('key', 'not in', [...underWay]);
      return left.orderBy('urgent', 'desc').orderBy('created_at_ms').limit(most);
    })
    .where('settled_at_ms', 'is', null)
    .where(free)
    .returningAll()
    .execute();
  return rows.map(keptOf);
};

const tidy = async (db: Database, emptyBeforeMs: InstantMs, forgetBeforeMs: InstantMs): Promise<void> => {
  await db
    .updateTable('deliveries')
    .set({ content: '' })
    .where('settled_at_ms', '<', emptyBeforeMs)
    .where('content', '!=', '')
    .execute();
  await db.deleteFrom('deliveries').where('settled_at_ms', '<', forgetBeforeMs).execute();
};

const done = async (work: Promise<unknown>): Promise<null> => {
  await work;
  return null;
};

export const deliveryStore = ({ read, write }: Access): DeliveryStore => ({
  take: (saying, deliveryId, lease, nowMs) =>
    write((db) => take(db, newRow(saying, deliveryId, lease, nowMs), nowMs)),
  begin: (key, lease, nowMs) => write((db) => begin(db, key, lease, nowMs)),
  undone: (key, holder) =>
    write((db) =>
      done(
        db
          .updateTable('deliveries')
          .set({ unsure: 0 })
          .where('key', '=', key)
          .where('holder', '=', holder)
          .execute(),
      ),
    ),
  settle: (key, outcome, nowMs) =>
    write((db) =>
      done(
        db
          .updateTable('deliveries')
          .set({ outcome: JSON.stringify(outcome), settled_at_ms: nowMs, unsure: 0 })
          .where('key', '=', key)
          .where('settled_at_ms', 'is', null)
          .execute(),
      ),
    ),
  renew: (keys, lease) => write((db) => done(renew(db, 'deliveries', keys, lease))),
  takeOver: (lease, nowMs, underWay, most) => write((db) => takeOver(db, lease, nowMs, underWay, most)),
  release: (holder) => write((db) => done(release(db, 'deliveries', holder))),
  find: (keys) =>
    read(async (db) => {
      const rows = await db
        .selectFrom('deliveries')
        .selectAll()
        .where('key', 'in', [...keys])
        .execute();
      return rows.map(keptOf);
    }),
  tidy: (emptyBeforeMs, forgetBeforeMs) => write((db) => done(tidy(db, emptyBeforeMs, forgetBeforeMs))),
});
