import type { PinState } from '../terms/pins.ts';
import type { Subscription, SubscriptionKind, SubscriptionState } from '../terms/subscriptions.ts';

/** The tables as the query builder sees them. Column names are the names in the database. */
export type PriceColumnsRow = {
  readonly digest: string;
  readonly ticker: string;
  readonly price_count: number;
  readonly packed: Uint8Array;
};

export type AnswerRow = {
  readonly id: string;
  /** The entry of the chain that vouches for this row. */
  readonly number: number;
  readonly content: string;
  readonly verb: string;
  readonly question: string;
  readonly as_of: string;
  readonly method_version: string;
  readonly body: string;
};

export type AnswerIdRow = { readonly id: string; readonly answer_id: string; readonly place: number };

export type AnswerSeriesRow = {
  readonly answer_id: string;
  readonly place: number;
  readonly ticker: string;
  readonly prices: string;
  /** What the closes mean and what the feed says of them, as JSON. */
  readonly about: string;
};

export type AskingRow = {
  readonly number: number;
  readonly answer_id: string;
  readonly asked_at_ms: number;
  readonly place: string;
  readonly team: string | null;
  readonly channel: string | null;
  readonly person: string | null;
  readonly message: string | null;
  readonly thread: string | null;
  readonly words: string;
  readonly reply_text: string;
  readonly bot_version: string;
  readonly node_version: string;
  readonly settings_hash: string;
};

export type EntryKind = 'answer' | 'asking' | 'deletion';

export type ChainRow = {
  readonly number: number;
  readonly kind: EntryKind;
  /** The id of the answer, or for a deletion the number of the entry whose row was taken out. */
  readonly subject: string;
  readonly digest: string;
  readonly previous: string;
  readonly hash: string;
};

/** One row: its update is what every writer waits for, so that entries never fork. */
export type ChainHeadRow = { readonly name: 'head'; readonly length: number; readonly hash: string };

export type SchemaVersionRow = { readonly version: number };

/** What somebody deals with: until when nobody else may, and when it was done with. */
export type LeasedRow = {
  readonly key: string;
  readonly holder: string | null;
  readonly lease_until_ms: number;
  readonly settled_at_ms: number | null;
};

export type InboxRow = LeasedRow & {
  /** The same before and after an edit; null for what cannot be edited. */
  readonly message_key: string | null;
  readonly kind: 'question' | 'command' | 'press';
  readonly asked_at_ms: number;
  /** What arrived, as JSON; emptied some time after it was dealt with. */
  readonly body: string;
  /** How often somebody began to deal with it. */
  readonly tries: number;
  /** The message that was to be changed into the answer, as JSON. */
  readonly editing: string | null;
};

export type DeliveryRow = LeasedRow & {
  readonly delivery_id: string;
  readonly team: string;
  readonly channel: string;
  readonly thread: string | null;
  /** What is said, as JSON; emptied some time after it was settled. */
  readonly content: string;
  readonly urgent: number;
  readonly expires_at_ms: number | null;
  readonly created_at_ms: number;
  readonly first_attempt_ms: number | null;
  readonly last_attempt_ms: number | null;
  readonly unsure: number;
  /** As JSON, once it is settled. */
  readonly outcome: string | null;
};

export type SubscriptionRow = {
  readonly team: string;
  readonly id: string;
  readonly kind: SubscriptionKind;
  /** What the id counts: ids ascend as numbers do, not as texts. */
  readonly number: number;
  readonly owner: string;
  readonly place: Subscription['place'];
  readonly channel: string;
  /** Canonical questions, as JSON. */
  readonly questions: string;
  readonly body: string;
  /** As JSON. */
  readonly schedule: string | null;
  readonly state: SubscriptionState;
  readonly paused_why: Subscription['pausedWhy'];
  readonly revision: number;
  readonly created_at_ms: number;
  readonly next_due_ms: number | null;
  readonly settled_up_to_ms: number;
  readonly awaiting_until_ms: number | null;
  readonly memory: string;
};

export type SubscriptionCounterRow = {
  readonly team: string;
  readonly kind: SubscriptionKind;
  readonly last: number;
};

export type PinRow = {
  readonly team: string;
  readonly channel: string;
  /** Empty at the top of a channel. */
  readonly thread: string;
  readonly answer_id: string;
  readonly question: string;
  readonly as_of: string;
  readonly sentence: string;
  readonly person: string | null;
  readonly state: PinState;
  readonly card_ts: string | null;
  readonly times: number;
  readonly pinned_at_ms: number;
  readonly told_moved: number;
  readonly told_restated: number;
};

export type ChannelMoveRow = {
  readonly team: string;
  readonly from_id: string;
  readonly to_id: string;
  readonly noted_order: number;
};

export type Tables = {
  readonly price_columns: PriceColumnsRow;
  readonly answers: AnswerRow;
  readonly answer_ids: AnswerIdRow;
  readonly answer_series: AnswerSeriesRow;
  readonly askings: AskingRow;
  readonly chain: ChainRow;
  readonly chain_head: ChainHeadRow;
  readonly inbox: InboxRow;
  readonly deliveries: DeliveryRow;
  readonly subscriptions: SubscriptionRow;
  readonly subscription_counters: SubscriptionCounterRow;
  readonly subscription_claims: LeasedRow;
  readonly pins: PinRow;
  readonly channel_moves: ChannelMoveRow;
  readonly schema_versions: SchemaVersionRow;
};
